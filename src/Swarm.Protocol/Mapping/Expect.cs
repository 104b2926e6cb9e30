using System.Diagnostics.CodeAnalysis;

namespace Swarm.Protocol.Mapping;

/// <summary>What must hold of a message before it is believed.</summary>
internal static class Expect
{
    /// <exception cref="InvalidDataException">It does not hold.</exception>
    public static void That([DoesNotReturnIf(false)] bool holds, string contradiction)
    {
        if (!holds) throw new InvalidDataException(contradiction);
    }

    public static T Present<T>([NotNull] T? part, string name)
        where T : class
    {
        That(part is not null, $"{name} is missing");
        return part;
    }

    public static void Finite(IEnumerable<double> values, string name) => That(values.All(double.IsFinite), $"{name} is not finite");

    /// <summary>A count that fits the positive half of 64 bits.</summary>
    public static long Count(ulong value, string name)
    {
        That(value <= long.MaxValue, $"{name} is out of range");
        return (long)value;
    }
}
