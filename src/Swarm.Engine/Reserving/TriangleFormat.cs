namespace Swarm.Engine.Reserving;

/// <summary>How a triangle's file is to be read.</summary>
public sealed record TriangleFormat
{
    /// <summary>What the amounts are.</summary>
    public required TriangleAmounts Amounts { get; init; }

    /// <summary>How the cells are laid out; told from the header by default.</summary>
    public TriangleLayout Layout { get; init; } = TriangleLayout.FromHeader;

    /// <summary>Header of the origin periods in the long form. Case does not matter.</summary>
    public string OriginColumn { get; init; } = "origin";

    /// <summary>Header of the development periods in the long form.</summary>
    public string DevelopmentColumn { get; init; } = "development";

    /// <summary>Header of the amounts in the long form.</summary>
    public string AmountColumn { get; init; } = "amount";

    /// <summary>12 for yearly, 3 for quarterly periods; told from the origin labels by default.</summary>
    public int? MonthsPerPeriod { get; init; }

    /// <summary>The date of the latest diagonal, to be checked against the data, or null.</summary>
    public DateOnly? AsOf { get; init; }
}

/// <summary>What the amounts of a triangle's file are.</summary>
public enum TriangleAmounts
{
    /// <summary>All that fell from the start to the end of the development period.</summary>
    Cumulative,

    /// <summary>What fell in the development period alone.</summary>
    Incremental,
}

/// <summary>How the cells of a triangle's file are laid out.</summary>
public enum TriangleLayout
{
    /// <summary>As the header says.</summary>
    FromHeader,

    /// <summary>A row for each cell: origin, development, amount.</summary>
    Long,

    /// <summary>A row for each origin, a column for each development.</summary>
    Square,
}
