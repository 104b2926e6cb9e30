namespace Swarm.Engine.Reserving;

/// <summary>A triangle to be read from a data file.</summary>
public sealed record TriangleRequest
{
    /// <summary>Name of the file, for messages.</summary>
    public required string FileName { get; init; }

    /// <summary>Its bytes.</summary>
    public required byte[] Content { get; init; }

    /// <summary>How the table is laid out; told from the header by default.</summary>
    public TriangleLayout Layout { get; init; }

    /// <summary>What the amounts are.</summary>
    public TriangleAmounts Amounts { get; init; }

    /// <summary>Header of the origin column.</summary>
    public string OriginColumn { get; init; } = "origin";

    /// <summary>Header of the development column of a long table.</summary>
    public string DevelopmentColumn { get; init; } = "development";

    /// <summary>Header of the amount column of a long table.</summary>
    public string AmountColumn { get; init; } = "amount";

    /// <summary>12 for yearly, 3 for quarterly periods, or null to tell from the labels.</summary>
    public int? MonthsPerPeriod { get; init; }

    /// <summary>The day that the latest diagonal stands for, or null where the model does not say.</summary>
    public DateOnly? AsOf { get; init; }
}

/// <summary>Layouts of a triangle's table.</summary>
public enum TriangleLayout
{
    /// <summary>As the header says.</summary>
    FromHeader,

    /// <summary>One line a cell: origin, development, amount.</summary>
    Long,

    /// <summary>One line an origin, one column a development.</summary>
    Square,
}

/// <summary>What a triangle's amounts are.</summary>
public enum TriangleAmounts
{
    /// <summary>Sums up to and with the development period.</summary>
    Cumulative,

    /// <summary>What fell in the development period.</summary>
    Incremental,
}
