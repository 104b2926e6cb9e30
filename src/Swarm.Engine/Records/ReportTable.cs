namespace Swarm.Engine.Records;

/// <summary>A table that a component reports beside the simulated figures: a formula's result, or a diagnostic.</summary>
/// <param name="Code">What the table is, for programs and pictures: see <see cref="ReportTableCodes"/>.</param>
/// <param name="Component">The component's name in the model.</param>
/// <param name="Title">A heading for people.</param>
/// <param name="Columns">The columns, all of one length.</param>
public sealed record ReportTable(string Code, string Component, string Title, IReadOnlyList<ReportColumn> Columns)
{
    /// <summary>Number of rows.</summary>
    public int Rows => Columns.Count == 0 ? 0 : Columns[0].Length;

    /// <summary>The column of a name, or null.</summary>
    public ReportColumn? Column(string name) => Columns.FirstOrDefault(column => column.Name == name);
}

/// <summary>A column of a <see cref="ReportTable"/>: texts or numbers.</summary>
public sealed record ReportColumn
{
    private ReportColumn(string name, ColumnKind kind) => (Name, Kind) = (name, kind);

    /// <summary>Heading.</summary>
    public string Name { get; }

    /// <summary>What the values are, which says how they are shown.</summary>
    public ColumnKind Kind { get; }

    /// <summary>The values of a column of labels, else empty.</summary>
    public IReadOnlyList<string> Labels { get; private init; } = [];

    /// <summary>The values of a column of numbers, else empty. Not a number stands for an empty cell.</summary>
    public IReadOnlyList<double> Numbers { get; private init; } = [];

    /// <summary>Number of values.</summary>
    public int Length => Kind == ColumnKind.Label ? Labels.Count : Numbers.Count;

    /// <summary>A column of texts.</summary>
    public static ReportColumn OfLabels(string name, IReadOnlyList<string> labels) => new(name, ColumnKind.Label) { Labels = labels };

    /// <summary>A column of numbers.</summary>
    /// <exception cref="ArgumentException">The kind is <see cref="ColumnKind.Label"/>.</exception>
    public static ReportColumn OfNumbers(string name, ColumnKind kind, IReadOnlyList<double> numbers) =>
        kind == ColumnKind.Label
            ? throw new ArgumentException("Labels are texts.", nameof(kind))
            : new ReportColumn(name, kind) { Numbers = numbers };
}

/// <summary>What the values of a column are.</summary>
public enum ColumnKind
{
    /// <summary>Texts.</summary>
    Label,

    /// <summary>Amounts of money in the model's unit.</summary>
    Money,

    /// <summary>Whole numbers.</summary>
    Count,

    /// <summary>Shares and probabilities, shown in per cent.</summary>
    Share,

    /// <summary>Other numbers.</summary>
    Number,
}

/// <summary>Codes of the tables that other parts of the program look for.</summary>
public static class ReportTableCodes
{
    /// <summary>Residuals, a row a cell, with the columns of <see cref="ResidualColumns"/>.</summary>
    public const string Residuals = "residuals";

    /// <summary>Link ratios by calendar period: Mack's calendar year test.</summary>
    public const string CalendarTest = "calendar-test";

    /// <summary>True for tables that judge a fit; a short page leaves them out.</summary>
    public static bool IsDiagnostic(string code) => code == CalendarTest || code.StartsWith(Residuals, StringComparison.Ordinal);
}

/// <summary>Columns of a table of residuals.</summary>
public static class ResidualColumns
{
    /// <summary>Label of the origin period.</summary>
    public const string Origin = "origin";

    /// <summary>Development period, from 1.</summary>
    public const string Development = "development";

    /// <summary>Label of the calendar period.</summary>
    public const string Calendar = "calendar";

    /// <summary>The residual.</summary>
    public const string Residual = "residual";
}
