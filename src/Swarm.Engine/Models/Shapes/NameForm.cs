using System.Globalization;
using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Shapes;

/// <summary>Which indices a key that names a quantity may have.</summary>
internal sealed class NameForm
{
    private const string Free = "^(?!(" + NameText.ReservedWords + @")(\[|\.|$))" + NameText.Pattern;

    private NameForm(string indices, string pattern, string allowed)
    {
        Indices = indices;
        Pattern = Free + pattern + "$";
        Allowed = allowed;
    }

    /// <summary>A component: no index.</summary>
    public static NameForm Component { get; } = new("", "", "a name has no index here");

    /// <summary>A draw: none, or <c>[t]</c>.</summary>
    public static NameForm Draw { get; } = new("t", @"(\[t\])?", "a draw is written x, or x[t] for a value at each step");

    /// <summary>A formula: none, <c>[t]</c>, or <c>[0]</c>.</summary>
    public static NameForm Formula { get; } =
        new(
            "t0",
            @"(\[(t|0)\])?",
            "a formula is written x, x[t] for a value at each step, or x[0] for the value before the first step");

    /// <summary>An outcome: none, <c>[t]</c>, a step, or <c>[horizon]</c>.</summary>
    public static NameForm Outcome { get; } =
        new("t0nh", @"(\[(t|0|[1-9][0-9]{0,4}|horizon)\])?", "an outcome is written x, x[t], x[30] or x[horizon]");

    /// <summary>The keys as a regular expression for the JSON schema.</summary>
    public string Pattern { get; }

    /// <summary>The forms that are right, for a hint.</summary>
    public string Allowed { get; }

    private string Indices { get; }

    /// <summary>Reads a key; null if it has another form. An index <c>[horizon]</c> comes out as step -1.</summary>
    public QuantityName? Read(string key)
    {
        int length = NameText.LengthAt(key, 0);
        if (length == 0 || IsReserved(key[..length]))
        {
            return null;
        }

        string name = key[..length];
        string index = key[length..];
        return index switch
        {
            "" => new QuantityName(name, QuantityKind.PerTrial, 0),
            "[t]" when Indices.Contains('t') => new QuantityName(name, QuantityKind.PerStep, 0),
            "[0]" when Indices.Contains('0') => new QuantityName(name, QuantityKind.AtStep, 0),
            "[horizon]" when Indices.Contains('h') => new QuantityName(name, QuantityKind.AtStep, -1),
            _ when Indices.Contains('n') && Step(index) is int step => new QuantityName(name, QuantityKind.AtStep, step),
            _ => null,
        };
    }

    /// <summary>True if the first part of a name is a word of formulas.</summary>
    public static bool IsReserved(string name) => NameText.IsReserved(name.Split('.', 2)[0]);

    private static int? Step(string index)
    {
        const int MaxLength = 7;
        bool isBracketed = index.Length is > 2 and <= MaxLength && index[0] == '[' && index[^1] == ']' && index[1] != '0';
        return isBracketed && int.TryParse(index.AsSpan(1, index.Length - 2), NumberStyles.None, CultureInfo.InvariantCulture, out int step)
            ? step
            : null;
    }
}
