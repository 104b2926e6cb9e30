using Swarm.Engine.Summaries;

namespace Swarm.Cli.Plots;

/// <summary>
/// A density drawn from a sketch. Values that many trials share stand apart as atoms. The distribution function of the other
/// trials is a monotone curve through the sketch's clusters; its differences are smoothed by a normal kernel with the bandwidth
/// of Silverman (1986), equation 3.31.
/// </summary>
internal sealed class DensityEstimate
{
    private const int Bins = 400;
    private const double AtomShare = 0.005;
    private const double Edge = 0.0005;
    private const int FewestClusters = 20;
    private const double FewestBinsOfBandwidth = 1.5;
    private const double Reach = 4;
    private const double BoundShare = 0.2;

    private DensityEstimate(double[] values, double[] densities, (double Value, double Share)[] atoms) =>
        (Values, Densities, Atoms) = (values, densities, atoms);

    /// <summary>Midpoints of the bins, ascending; empty if hardly a trial lies off the atoms.</summary>
    public IReadOnlyList<double> Values { get; }

    /// <summary>Density at each midpoint of the trials that lie off the atoms.</summary>
    public IReadOnlyList<double> Densities { get; }

    /// <summary>Values that half a per cent of the trials or more have, with their shares.</summary>
    public IReadOnlyList<(double Value, double Share)> Atoms { get; }

    public static DensityEstimate Of(TDigest digest)
    {
        var total = (double)digest.TotalWeight;
        var clusters = Enumerable.Range(0, digest.Count).ToArray();
        bool IsLump(int i) => digest.IsAtomAt(i) && digest.WeightAt(i) > 1 && digest.WeightAt(i) / total >= AtomShare;
        (double, double)[] atoms = [.. clusters.Where(IsLump).Select(i => (digest.Means[i], digest.WeightAt(i) / total))];
        var (x, y) = DistributionFunction(digest, clusters.Where(i => !IsLump(i)));
        return x.Length < FewestClusters ? new DensityEstimate([], [], atoms) : Of(x, y, atoms);
    }

    private static DensityEstimate Of(double[] x, double[] y, (double, double)[] atoms)
    {
        double low = Quantile(x, y, Edge), high = Quantile(x, y, 1 - Edge);
        var width = (high - low) / Bins;
        var sigma = Math.Max(Bandwidth(x, y) / width, FewestBinsOfBandwidth);
        var curve = new MonotoneCubic(x, y);
        double[] edges = [.. Enumerable.Range(0, Bins + 1).Select(edge => curve.At(low + (edge * width)))];
        double[] heights = [.. Enumerable.Range(0, Bins).Select(bin => (edges[bin + 1] - edges[bin]) / (width * y[^1]))];
        var before = RoomBeyond(heights, sigma);
        var after = RoomBeyond([.. heights.Reverse()], sigma);
        double[] padded = [.. new double[before], .. heights, .. new double[after]];
        double[] values = [.. Enumerable.Range(-before, padded.Length).Select(bin => low + ((bin + 0.5) * width))];
        return new DensityEstimate(values, Smooth(padded, sigma), atoms);
    }

    /// <summary>Bins that a curve needs to run out beyond an end; none where it stands high up, at a bound of the values.</summary>
    private static int RoomBeyond(double[] heights, double sigma) =>
        heights.Take(Bins / 50).Average() > BoundShare * heights.Max() ? 0 : (int)Math.Ceiling(Reach * sigma);

    /// <summary>Trials below, with half of a cluster's own, at each cluster's mean; equal means are one point.</summary>
    private static (double[] X, double[] Y) DistributionFunction(TDigest digest, IEnumerable<int> clusters)
    {
        var (x, y) = (new List<double>(), new List<double>());
        var below = 0.0;
        foreach (var i in clusters)
        {
            var weight = digest.WeightAt(i);
            if (x.Count == 0 || digest.Means[i] > x[^1])
            {
                x.Add(digest.Means[i]);
                y.Add(below + (0.5 * weight));
            }

            below += weight;
        }

        return ([.. x], [.. y]);
    }

    private static double Quantile(double[] x, double[] y, double p)
    {
        var target = p * y[^1];
        var i = Math.Clamp(Array.FindIndex(y, height => height >= target), 1, x.Length - 1);
        return x[i - 1] + ((x[i] - x[i - 1]) * Math.Clamp((target - y[i - 1]) / (y[i] - y[i - 1]), 0, 1));
    }

    /// <summary>
    /// From the quartiles' distance alone, which heavy tails do not blow up as they do a standard deviation; and not below the
    /// distance of the sketch's clusters, whose traces would be seen.
    /// </summary>
    private static double Bandwidth(double[] x, double[] y)
    {
        double first = Quantile(x, y, 0.25), third = Quantile(x, y, 0.75);
        var clusters = x.Count(mean => mean >= first && mean <= third);
        return (third - first) * Math.Max(0.9 / 1.34 * Math.Pow(y[^1], -0.2), 1.0 / Math.Max(1, clusters));
    }

    /// <summary>A normal kernel, cut at four bandwidths; at the ends what would fall outside is reflected.</summary>
    private static double[] Smooth(double[] heights, double sigma)
    {
        var reach = (int)Math.Ceiling(Reach * sigma);
        double[] kernel = [.. Enumerable.Range(-reach, (2 * reach) + 1).Select(k => Math.Exp(-0.5 * k * k / (sigma * sigma)))];
        var mass = kernel.Sum();
        var smooth = new double[heights.Length];
        for (var bin = 0; bin < heights.Length; bin++)
        {
            for (var k = -reach; k <= reach; k++) smooth[bin] += kernel[k + reach] / mass * heights[Reflected(bin + k, heights.Length)];
        }

        return smooth;
    }

    private static int Reflected(int bin, int count)
    {
        if (bin < 0) bin = -bin - 1;
        if (bin >= count) bin = (2 * count) - bin - 1;
        return Math.Clamp(bin, 0, count - 1);
    }
}
