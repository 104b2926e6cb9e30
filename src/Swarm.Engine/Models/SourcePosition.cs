namespace Swarm.Engine.Models;

/// <summary>A place in an input file.</summary>
/// <param name="File">Name of the file as the user gave it.</param>
/// <param name="Line">Line, from 1.</param>
/// <param name="Column">Column, from 1.</param>
public readonly record struct SourcePosition(string File, int Line, int Column)
{
    /// <summary><c>file:line:column</c>.</summary>
    public override string ToString() => $"{File}:{Line}:{Column}";
}
