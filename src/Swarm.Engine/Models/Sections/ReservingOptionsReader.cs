using Swarm.Engine.Models.Documents;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Models.Sections;

/// <summary>Reads the options of a reserving method.</summary>
/// <param name="options">The triangle's mapping.</param>
/// <param name="triangle">The triangle.</param>
/// <param name="diagnostics">Where options that do not go together are told.</param>
internal sealed class ReservingOptionsReader(MappingNode options, Triangle triangle, DiagnosticList diagnostics)
{
    /// <summary>True if nothing was wrong with the options.</summary>
    public bool IsRight { get; private set; } = true;

    public ReservingOptions Read()
    {
        MappingNode? ratios = options.Mapping("link_ratios");
        ReservingMethod method = options.Text("method") == "mack" ? ReservingMethod.Mack : ReservingMethod.OdpBootstrap;
        RefuseUnfit(method);
        return new ReservingOptions
        {
            Method = method,
            Process = Process(options.Text("process")),
            Average = ratios.Text("average") == "simple" ? LinkRatioAverage.Simple : LinkRatioAverage.VolumeWeighted,
            LastPeriods = ratios.Whole("last"),
            Excluded = [.. (ratios.Items("exclude") ?? []).OfType<MappingNode>().Select(Excluded).OfType<(int, int)>()],
            Tail = Tail(options.Mapping("tail")),
            Scale = options.Text("scale") == "by_development" ? ScaleForm.ByDevelopment : ScaleForm.Constant,
            KeepZeroResiduals = options.Text("zero_residuals") != "drop",
            CentreResiduals = options.Truth("centre") ?? false,
            Booked = Booked(options.Mapping("booked")),
        };
    }

    private void Refuse(SourcePosition position, string message, string hint)
    {
        IsRight = false;
        diagnostics.Error(position, message, hint);
    }

    private static ProcessError Process(string? word) => word switch
    {
        "over_dispersed_poisson" => ProcessError.OverDispersedPoisson,
        "lognormal" => ProcessError.Lognormal,
        _ => ProcessError.Gamma,
    };

    private void RefuseUnfit(ReservingMethod method)
    {
        bool isMack = method == ReservingMethod.Mack;
        string unfit = isMack ? "over_dispersed_poisson" : "lognormal";
        if (options.Scalar("process") is { } process && process.Text == unfit)
        {
            Refuse(
                process.Position,
                $"process '{unfit}' does not go with method '{(isMack ? "mack" : "odp_bootstrap")}'",
                $"write gamma or {(isMack ? "lognormal" : "over_dispersed_poisson")}");
        }

        foreach (string key in isMack ? ["scale", "zero_residuals", "centre"] : Array.Empty<string>())
        {
            if (options.Entry(key) is { } entry)
            {
                diagnostics.Warning(entry.Key.Position, $"'{key}' has no effect with method 'mack'", "remove it");
            }
        }
    }

    private (int Origin, int Development)? Excluded(MappingNode cell)
    {
        if (cell.Scalar("origin") is not { } label || cell.Whole("development") is not int development)
        {
            return null;
        }

        for (int origin = 0; origin < triangle.Origins.Count; origin++)
        {
            if (triangle.Origins[origin] != label.Text)
            {
                continue;
            }

            if (development < triangle.Known(origin))
            {
                return (origin, development - 1);
            }

            Refuse(
                cell.Position,
                $"origin {label.Text} has no link ratio from development {development}",
                triangle.Known(origin) > 1
                    ? $"its link ratios begin at developments 1 to {triangle.Known(origin) - 1}"
                    : "it has no link ratio at all");
            return null;
        }

        Refuse(
            label.Position,
            $"the triangle has no origin {DiagnosticList.Quote(label.Text)}",
            $"its origins are {triangle.Origins[0]} to {triangle.Origins[^1]}");
        return null;
    }

    private TailOptions? Tail(MappingNode? tail)
    {
        if (tail is null)
        {
            return null;
        }

        double? factor = tail.Number("factor");
        if (factor is null && tail.Entry("sd") is { } sd)
        {
            Refuse(sd.Key.Position, "'sd' goes with 'factor'; a fitted tail has none of its own", "remove it");
        }

        if (factor < 1)
        {
            diagnostics.Warning(
                tail.Scalar("factor")!.Position,
                "a tail factor below 1 lets claims shrink beyond the triangle",
                "1.01 means 1% more");
        }

        return new TailOptions { Factor = factor, Sd = tail.Number("sd") ?? 0, Periods = tail.Whole("periods") ?? 1 };
    }

    private static BookedEstimate? Booked(MappingNode? booked) =>
        booked.Number("best_estimate") is double amount
            ? new BookedEstimate(amount, booked.Text("by") == "shift" ? BookedForm.Shift : BookedForm.Scaling)
            : null;
}
