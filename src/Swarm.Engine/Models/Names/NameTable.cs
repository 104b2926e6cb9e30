using Swarm.Engine.Models.Formulas;

namespace Swarm.Engine.Models.Names;

/// <summary>Where a quantity comes from.</summary>
internal enum QuantityOrigin
{
    Draw,
    Formula,
    Component,
}

/// <summary>What is known of a name.</summary>
/// <param name="Name">The name without index.</param>
/// <param name="Origin">Where its values come from.</param>
/// <param name="Position">Where it was first declared.</param>
internal sealed record KnownQuantity(string Name, QuantityOrigin Origin, SourcePosition Position)
{
    /// <summary>True if it exists for steps, false if once per trial.</summary>
    public bool IsStepped { get; init; }

    /// <summary>True if the steps 1..horizon are given.</summary>
    public bool HasSteps { get; init; }

    /// <summary>True if step 0 is given.</summary>
    public bool HasStart { get; init; }
}

/// <summary>The names of a model.</summary>
/// <param name="diagnostics">Where clashes are told.</param>
internal sealed class NameTable(DiagnosticList diagnostics)
{
    private readonly Dictionary<string, KnownQuantity> _perTrialOrSteps = new(StringComparer.Ordinal);
    private readonly Dictionary<string, KnownQuantity> _componentSteps = new(StringComparer.Ordinal);
    private readonly Dictionary<string, SourcePosition> _components = new(StringComparer.Ordinal);
    private readonly HashSet<string> _unreadable = new(StringComparer.Ordinal);
    private readonly HashSet<string> _refused = new(StringComparer.Ordinal);

    /// <summary>All names.</summary>
    public IEnumerable<KnownQuantity> All => _perTrialOrSteps.Values.Concat(_componentSteps.Values);

    /// <summary>Finds a name; <paramref name="wantsSteps"/> chooses where a component has a quantity in both ways.</summary>
    public KnownQuantity? Find(string name, bool wantsSteps) =>
        (wantsSteps ? _componentSteps.GetValueOrDefault(name) : null)
        ?? _perTrialOrSteps.GetValueOrDefault(name)
        ?? _componentSteps.GetValueOrDefault(name);

    /// <summary>The component that a name belongs to, by what stands before one of its dots, or null.</summary>
    public string? ComponentOf(string name)
    {
        for (int dot = name.Length; dot > 0; dot = name.LastIndexOf('.', dot - 1))
        {
            if (_components.ContainsKey(name[..dot]))
            {
                return name[..dot];
            }
        }

        return null;
    }

    /// <summary>True if parts of the document that declare names could not be read, so that any name may exist.</summary>
    public bool IsIncomplete { get; init; }

    /// <summary>True if nobody can know whether an unknown name exists, since what may declare it was refused already.</summary>
    public bool MayExist(string name) =>
        IsIncomplete || _refused.Contains(name) || (ComponentOf(name) is { } component && _unreadable.Contains(component));

    /// <summary>Remembers the name of a key that was refused, so that what refers to it is not refused, too.</summary>
    public void Refuse(string key) => _refused.Add(key[..NameText.LengthAt(key, 0)]);

    /// <summary>Declares a component; its quantities follow, unless it could not be read.</summary>
    public void DeclareComponent(string name, SourcePosition position)
    {
        string? outer = ComponentOf(name) ?? _components.Keys.FirstOrDefault(c => c.StartsWith(name + ".", StringComparison.Ordinal));
        if (outer is not null)
        {
            diagnostics.Error(
                position,
                $"'{name}' and '{outer}' cannot be told apart: one begins with the other",
                "choose another name");
        }

        _components.TryAdd(name, position);
        _unreadable.Add(name);
    }

    /// <summary>Declares the quantities of a component that could be read.</summary>
    public void DeclareQuantities(string component, IEnumerable<string> perTrial, IEnumerable<string> perStep)
    {
        SourcePosition position = _components[component];
        _unreadable.Remove(component);
        foreach (string name in perTrial)
        {
            _perTrialOrSteps.TryAdd(name, new KnownQuantity(name, QuantityOrigin.Component, position));
        }

        foreach (string name in perStep)
        {
            _componentSteps.TryAdd(
                name,
                new KnownQuantity(name, QuantityOrigin.Component, position) { IsStepped = true, HasSteps = true });
        }
    }

    /// <summary>Declares a draw or formula.</summary>
    public void Declare(QuantityName name, QuantityOrigin origin, SourcePosition position)
    {
        if (ComponentOf(name.Name) is { } component)
        {
            diagnostics.Error(
                position,
                $"'{name.Name}' lies among the names of '{component}', a component in line {_components[component].Line}",
                "choose another name");
            return;
        }

        KnownQuantity added = new(name.Name, origin, position)
        {
            IsStepped = name.Kind != QuantityKind.PerTrial,
            HasSteps = name.Kind == QuantityKind.PerStep,
            HasStart = name.Kind == QuantityKind.AtStep,
        };
        if (_perTrialOrSteps.TryAdd(name.Name, added))
        {
            return;
        }

        KnownQuantity first = _perTrialOrSteps[name.Name];
        if (Clash(first, added) is { } clash)
        {
            diagnostics.Error(position, $"{clash}, first in line {first.Position.Line}", "choose another name for one of them");
            return;
        }

        _perTrialOrSteps[name.Name] = first with { HasSteps = first.HasSteps || added.HasSteps, HasStart = first.HasStart || added.HasStart };
    }

    /// <summary>Tells start values without steps, and steps without a horizon.</summary>
    public void CheckSteps(int? horizon)
    {
        foreach (KnownQuantity quantity in _perTrialOrSteps.Values.Where(q => q.IsStepped))
        {
            if (!quantity.HasSteps)
            {
                diagnostics.Error(
                    quantity.Position,
                    $"'{quantity.Name}[0]' is given, but no '{quantity.Name}[t]'",
                    $"add '{quantity.Name}[t]: ...', or leave the index away");
            }
            else if (horizon == 0)
            {
                diagnostics.Error(
                    quantity.Position,
                    $"'{quantity.Name}[t]' needs steps, but the model has none",
                    "add 'horizon: 30', the number of the last step");
            }
        }
    }

    private static string? Clash(KnownQuantity first, KnownQuantity second)
    {
        if (first.Origin != second.Origin)
        {
            return $"'{second.Name}' is a draw and a formula";
        }

        if (first.IsStepped != second.IsStepped)
        {
            return $"'{second.Name}' stands with and without an index";
        }

        bool isTwice = !first.IsStepped || (first.HasSteps && second.HasSteps) || (first.HasStart && second.HasStart);
        return isTwice ? $"'{second.Name}' stands here twice" : null;
    }
}
