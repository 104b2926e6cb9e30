using Swarm.Engine.Models.Shapes;

namespace Swarm.Engine.Models.Sections;

/// <summary>The shape of <c>triangles</c>.</summary>
internal static class TriangleShape
{
    private const int MaxTailPeriods = 200;
    private const int MaxExcluded = 1_000;

    public static MapShape Section { get; } = new(
        "Triangles of past claims, each with the method that turns it into a distribution of unpaid claims. "
        + "A triangle x gives x.unpaid, x.unpaid.ORIGIN, x.paid.PERIOD, x.expected, and with a horizon x.paid[t].",
        NameForm.Component,
        new ObjectShape(
            "Where the triangle's data are, and the method with its options.",
            [
                new Field("data", new TextShape("Name of the data file, a CSV, as seen from the model.")) { IsRequired = true },
                new Field("columns", Columns()),
                new Field("layout", new ChoiceShape(
                    "How the table is laid out; told from its header by default.",
                    [
                        new("long", "One line a cell: origin, development, amount."),
                        new("square", "One line an origin, one column a development."),
                    ])),
                new Field("amounts", new ChoiceShape(
                    "What the amounts are.",
                    [
                        new("cumulative", "Sums up to and with the development period."),
                        new("incremental", "What fell in the development period."),
                    ])) { IsRequired = true },
                new Field("period", new ChoiceShape(
                    "Length of origin and development periods.",
                    [new("year", "Years, written 2017 (the default)."), new("quarter", "Quarters, written 2017Q3.")])),
                new Field("as_of", new DateShape("The day that the latest diagonal stands for, as in 2025-12-31.")),
                .. Method(),
                new Field("stream", DrawsSection.StreamShape),
            ]));

    private static ObjectShape Columns() => new(
        "Headers of the table's columns where they differ from origin, development and amount.",
        [
            new Field("origin", new TextShape("Header of the origin column.")),
            new Field("development", new TextShape("Header of the development column, of a long table.")),
            new Field("amount", new TextShape("Header of the amount column, of a long table.")),
        ]);

    private static Field[] Method() =>
    [
        new("method", new ChoiceShape(
            "The stochastic method.",
            [
                new("odp_bootstrap", "Residual bootstrap of the over-dispersed Poisson model (England & Verrall 1999, 2002)."),
                new("mack", "Simulation of Mack's model (Mack 1993, 1999)."),
            ])) { IsRequired = true },
        new("process", new ChoiceShape(
            "Distribution of the process error.",
            [
                new("gamma", "Gamma (the default)."),
                new("over_dispersed_poisson", "Over-dispersed Poisson; with odp_bootstrap only."),
                new("lognormal", "Lognormal; with mack only."),
            ])),
        new("link_ratios", LinkRatios()),
        new("tail", Tail()),
        new("scale", new ChoiceShape(
            "Scale parameter of the over-dispersed Poisson model.",
            [
                new("constant", "One for all cells (the default)."),
                new("by_development", "One per development period, pooled where one residual is left."),
            ])),
        new("zero_residuals", new ChoiceShape(
            "What becomes of the residuals that are zero by construction.",
            [new("keep", "They are resampled like all others (the default)."), new("drop", "They are left out.")])),
        new("centre", ChoiceShape.Truth("Subtracts the mean of the residuals before they are resampled (default false).")),
        new("booked", new ObjectShape(
            "Moves the distribution to a booked best estimate.",
            [
                new Field(
                    "best_estimate",
                    new NumberShape("The booked amount, in the unit of the triangle.") { Above = 0 }) { IsRequired = true },
                new Field("by", new ChoiceShape(
                    "How the distribution is moved.",
                    [
                        new("scaling", "Every amount is multiplied by booked over mean."),
                        new("shift", "Booked less mean is added to every trial."),
                    ])) { IsRequired = true },
            ])),
    ];

    private static ObjectShape LinkRatios() => new(
        "How link ratios are averaged.",
        [
            new Field("average", new ChoiceShape(
                "The average.",
                [
                    new("volume_weighted", "Weighted by the first cell's cumulative amount (the default)."),
                    new("simple", "Arithmetic mean."),
                ])),
            new Field(
                "last",
                Count("Only link ratios of so many latest calendar periods count.", ModelBounds.ListLength)),
            new Field("exclude", new ListShape(
                "Link ratios that are left out.",
                new ObjectShape(
                    "The first cell of a link ratio that is left out.",
                    [
                        new Field("origin", new TextShape("Its origin period, as in 2019.")) { IsRequired = true },
                        new Field(
                            "development",
                            Count("Its development period, counted from 1.", ModelBounds.ListLength)) { IsRequired = true },
                    ])) { Most = MaxExcluded }),
        ]);

    private static NumberShape Count(string help, int most) => new(help) { IsWhole = true, Least = 1, Most = most };

    private static ObjectShape Tail() => new(
        "Development beyond the triangle: a factor, or an exponential decay fitted to the link ratios.",
        [
            new Field(
                "factor",
                new NumberShape("Factor from the last development to ultimate, as in 1.01.") { Above = 0, Most = 100 }),
            new Field(
                "sd",
                new NumberShape("Standard deviation of the factor (default 0); with factor only.") { Least = 0, Most = 100 }),
            new Field(
                "fit",
                new ChoiceShape("Fits the tail to the link ratios.", [new("exponential", "Exponential decay of the link ratios towards 1.")])),
            new Field(
                "periods",
                Count("Development periods in which the tail is paid (default 1).", MaxTailPeriods)),
        ])
    { OneOf = ["factor", "fit"] };
}
