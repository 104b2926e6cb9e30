namespace Swarm.Engine.Models.Shapes;

/// <summary>
/// What may stand at a place of the document. The reader's check of structure and the JSON schema for editors are both made
/// from these, so they cannot disagree.
/// </summary>
/// <param name="Help">What an editor shows on hovering, as plain sentences.</param>
internal abstract record Shape(string Help);

/// <summary>Free text.</summary>
internal sealed record TextShape(string Help) : Shape(Help);

/// <summary>A number, as a model writes it.</summary>
internal sealed record NumberShape(string Help) : Shape(Help)
{
    /// <summary>Least value, or null.</summary>
    public double? Least { get; init; }

    /// <summary>Value that the number must be above, or null.</summary>
    public double? Above { get; init; }

    /// <summary>Greatest value, or null.</summary>
    public double? Most { get; init; }

    /// <summary>Value that the number must be below, or null.</summary>
    public double? Below { get; init; }

    /// <summary>True if it counts something.</summary>
    public bool IsWhole { get; init; }
}

/// <summary>One of some words.</summary>
internal sealed record ChoiceShape(string Help, IReadOnlyList<Choice> Choices) : Shape(Help)
{
    /// <summary>True for the two words of yes-no questions, <c>true</c> and <c>false</c>.</summary>
    public bool IsTruth { get; init; }

    /// <summary>A question of yes or no.</summary>
    public static ChoiceShape Truth(string help) => new(help, [new("true", "Yes."), new("false", "No.")]) { IsTruth = true };
}

/// <summary>A word of a choice.</summary>
internal sealed record Choice(string Word, string Help);

/// <summary>A day, as <c>2025-12-31</c>.</summary>
internal sealed record DateShape(string Help) : Shape(Help);

/// <summary>A formula.</summary>
internal sealed record FormulaShape(string Help) : Shape(Help);

/// <summary>A distribution, as <c>normal(mean=0, sd=1)</c>.</summary>
internal sealed record DistributionShape(string Help) : Shape(Help);

/// <summary>A list.</summary>
internal sealed record ListShape(string Help, Shape Item) : Shape(Help)
{
    /// <summary>Least number of items.</summary>
    public int Least { get; init; }

    /// <summary>Greatest number of items.</summary>
    public int Most { get; init; } = ModelBounds.ListLength;
}

/// <summary>A mapping with known keys.</summary>
internal sealed record ObjectShape(string Help, IReadOnlyList<Field> Fields) : Shape(Help)
{
    /// <summary>Keys of which one must stand there, and not two.</summary>
    public IReadOnlyList<string> OneOf { get; init; } = [];

    /// <summary>True if nothing at all may stand in its place.</summary>
    public bool MayBeNothing { get; init; }
}

/// <summary>A key of an object.</summary>
internal sealed record Field(string Key, Shape Shape)
{
    /// <summary>True if it must be there.</summary>
    public bool IsRequired { get; init; }
}

/// <summary>A mapping whose keys are names of the user's choice.</summary>
internal sealed record MapShape(string Help, NameForm Names, Shape Value) : Shape(Help)
{
    /// <summary>Least number of entries.</summary>
    public int Least { get; init; }
}

/// <summary>A short form, or a mapping that can say more.</summary>
internal sealed record ShortOrLongShape(string Help, Shape Short, ObjectShape Long) : Shape(Help);
