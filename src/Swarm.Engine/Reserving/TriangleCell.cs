using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>One cell as a file gives it.</summary>
/// <param name="Origin">Its origin period.</param>
/// <param name="Age">Development as written: a number of periods, or of months.</param>
/// <param name="Amount">The amount; NaN where it could not be read, which was told.</param>
/// <param name="Position">Where the amount stands.</param>
internal sealed record TriangleCell(OriginPeriod Origin, int Age, double Amount, SourcePosition Position);
