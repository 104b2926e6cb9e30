namespace Swarm.Engine.Models;

/// <summary>A data file that a model names; the host reads it, the engine has no access to files.</summary>
/// <param name="Name">The name as the model writes it.</param>
/// <param name="Content">Its bytes.</param>
public sealed record DataFile(string Name, byte[] Content);
