namespace Swarm.Engine.Records;

/// <summary>Something that a reader of the figures must know: a choice of method, or what happened while running.</summary>
/// <param name="Code">A short constant name, as in <c>redrawn</c>, for programs.</param>
/// <param name="Text">One or more sentences for people.</param>
/// <param name="Number">The number that the text is about, or null.</param>
public sealed record Note(string Code, string Text, double? Number = null);
