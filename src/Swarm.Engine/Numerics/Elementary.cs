namespace Swarm.Engine.Numerics;

/// <summary>
/// Exponential, logarithm and power out of IEEE 754 operations and explicit fused multiply-add: the same bits at every vector
/// width and on every CPU. Every NaN result is <see cref="LaneMath.NaNBits"/>. Errors in ulp are measured against 50-digit
/// values (docs/accuracy.md).
/// </summary>
internal static partial class Elementary
{
    /// <inheritdoc cref="Exp{V}(V)"/>
    public static double Exp(double x) => Exp(Lanes64.Create(x)).Value;

    /// <inheritdoc cref="Expm1{V}(V)"/>
    public static double Expm1(double x) => Expm1(Lanes64.Create(x)).Value;

    /// <inheritdoc cref="Log{V}(V)"/>
    public static double Log(double x) => Log(Lanes64.Create(x)).Value;

    /// <inheritdoc cref="Log1p{V}(V)"/>
    public static double Log1p(double x) => Log1p(Lanes64.Create(x)).Value;

    /// <inheritdoc cref="Pow{V}(V, V)"/>
    public static double Pow(double x, double y) => Pow(Lanes64.Create(x), Lanes64.Create(y)).Value;
}
