using Swarm.Engine.Models;

namespace Swarm.Engine.Reserving;

/// <summary>One field of a CSV file, without its quotes and the spaces around it.</summary>
internal readonly record struct CsvField(string Text, SourcePosition Position);
