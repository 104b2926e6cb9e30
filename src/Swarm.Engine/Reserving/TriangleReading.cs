using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>What came of reading a triangle's file.</summary>
/// <param name="Triangle">The triangle, or null after an error.</param>
/// <param name="Diagnostics">All errors and warnings, in the order of the file.</param>
public sealed record TriangleReading(Triangle? Triangle, IReadOnlyList<Diagnostic> Diagnostics);
