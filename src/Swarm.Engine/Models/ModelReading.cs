namespace Swarm.Engine.Models;

/// <summary>What came out of reading a model document.</summary>
/// <param name="Model">The model, or null if anything in it is wrong.</param>
/// <param name="Diagnostics">All errors and warnings, in the order of their places.</param>
/// <param name="Data">The data files that the model names, each once, in the order in which it names them.</param>
public sealed record ModelReading(Model? Model, IReadOnlyList<Diagnostic> Diagnostics, IReadOnlyList<DataFile> Data);
