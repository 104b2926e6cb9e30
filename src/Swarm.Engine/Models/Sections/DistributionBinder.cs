using Swarm.Engine.Distributions;
using Swarm.Engine.Models.Formulas;
using Swarm.Engine.Models.Names;

namespace Swarm.Engine.Models.Sections;

/// <summary>Turns a written distribution into a bound one: finds the form by the parameters' names and hands it their values.</summary>
internal static class DistributionBinder
{
    /// <summary>The distribution, or null and diagnostics.</summary>
    public static Distribution? Bind(DistributionCall call, ReadingContext context)
    {
        DistributionForm[] forms = [.. context.Forms.Where(form => form.Name == call.Name)];
        if (forms.Length == 0)
        {
            ReportUnknownName(call, context);
            return null;
        }

        if (!AllAreNamed(call, forms, context.Diagnostics))
        {
            return null;
        }

        DistributionForm form = Nearest(forms, call);
        Dictionary<string, IReadOnlyList<double>>? values = Values(call, form, forms, context.Diagnostics);
        return values is null ? null : Bind(form, values, call, context.Diagnostics);
    }

    private static void ReportUnknownName(DistributionCall call, ReadingContext context)
    {
        string[] names = [.. context.Forms.Select(form => form.Name).Distinct()];
        string? nearest = NearestName.Of(call.Name, names);
        context.Diagnostics.Error(
            call.Position,
            $"no distribution is called {DiagnosticList.Quote(call.Name)}",
            nearest is null ? $"known are {string.Join(", ", names)}" : $"did you mean '{nearest}'?");
    }

    private static bool AllAreNamed(DistributionCall call, DistributionForm[] forms, DiagnosticList diagnostics)
    {
        CallArgument? unnamed = call.Arguments.FirstOrDefault(argument => argument.Name is null);
        if (unnamed is null)
        {
            return true;
        }

        DistributionForm likely = forms.FirstOrDefault(form => form.Parameters.Count == call.Arguments.Count) ?? forms[0];
        diagnostics.Error(
            unnamed.Position,
            "parameters of a distribution are given by name",
            $"write {likely.Name}({string.Join(", ", likely.Parameters.Select(Named))})");
        return false;
    }

    private static string Named(ParameterForm parameter) =>
        parameter.Name + (parameter.Kind == ParameterKind.Numbers ? "=[...]" : "=...");

    /// <summary>The form that most of the given names belong to, and of those the one that misses the fewest.</summary>
    private static DistributionForm Nearest(DistributionForm[] forms, DistributionCall call)
    {
        HashSet<string> given = [.. call.Arguments.Select(argument => argument.Name!)];
        return forms
            .OrderByDescending(form => form.Parameters.Count(p => given.Contains(p.Name)))
            .ThenBy(form => form.Parameters.Count)
            .First();
    }

    private static Dictionary<string, IReadOnlyList<double>>? Values(
        DistributionCall call, DistributionForm form, DistributionForm[] forms, DiagnosticList diagnostics)
    {
        Dictionary<string, IReadOnlyList<double>> values = new(StringComparer.Ordinal);
        bool isRight = true;
        foreach (CallArgument argument in call.Arguments)
        {
            ParameterForm? parameter = form.Parameters.FirstOrDefault(p => p.Name == argument.Name);
            if (parameter is null)
            {
                ReportUnknownParameter(argument, form, forms, diagnostics);
                isRight = false;
            }
            else if (Numbers(argument, parameter, diagnostics) is not { } numbers)
            {
                isRight = false;
                values.TryAdd(parameter.Name, []);
            }
            else if (!values.TryAdd(parameter.Name, numbers))
            {
                diagnostics.Error(argument.Position, $"'{parameter.Name}' is given twice", "keep one of them");
                isRight = false;
            }
        }

        string[] missing = [.. form.Parameters.Select(p => p.Name).Where(name => !values.ContainsKey(name))];
        if (missing.Length > 0 && call.Arguments.All(argument => form.Parameters.Any(p => p.Name == argument.Name)))
        {
            diagnostics.Error(
                call.Position,
                $"{call.Name} lacks {string.Join(" and ", missing.Select(name => $"'{name}'"))}",
                $"write {string.Join(" or ", forms.Select(f => f.Signature))}");
            isRight = false;
        }

        return isRight && missing.Length == 0 ? values : null;
    }

    private static void ReportUnknownParameter(
        CallArgument argument, DistributionForm form, DistributionForm[] forms, DiagnosticList diagnostics)
    {
        bool isOfOtherForm = forms.Any(f => f.Parameters.Any(p => p.Name == argument.Name));
        string? nearest = isOfOtherForm ? null : NearestName.Of(argument.Name!, form.Parameters.Select(p => p.Name));
        diagnostics.Error(
            argument.Position,
            isOfOtherForm
                ? $"'{argument.Name}' does not go with the other parameters of {form.Name}"
                : $"{form.Name} has no parameter {DiagnosticList.Quote(argument.Name!)}",
            nearest is null ? $"write {string.Join(" or ", forms.Select(f => f.Signature))}" : $"did you mean '{nearest}'?");
    }

    private static double[]? Numbers(CallArgument argument, ParameterForm parameter, DiagnosticList diagnostics)
    {
        bool wantsList = parameter.Kind == ParameterKind.Numbers;
        if (wantsList != argument.IsList)
        {
            diagnostics.Error(
                argument.Position,
                $"'{parameter.Name}' takes {(wantsList ? "a list" : "one number")}",
                wantsList ? $"write {parameter.Name}=[a, b]" : $"write {parameter.Name}=a");
            return null;
        }

        double[] numbers = new double[argument.Values.Count];
        for (int i = 0; i < numbers.Length; i++)
        {
            double? value = ConstantValue.Of(argument.Values[i]);
            if (value is not double number || !double.IsFinite(number))
            {
                diagnostics.Error(
                    argument.Values[i].Position,
                    value is null
                        ? $"'{parameter.Name}' refers to a quantity, but parameters are constant"
                        : $"'{parameter.Name}' is not a finite number",
                    value is null ? "draw a standardised value, and scale and shift it in a formula" : null);
                return null;
            }

            numbers[i] = number;
        }

        return numbers;
    }

    private static Distribution? Bind(
        DistributionForm form, Dictionary<string, IReadOnlyList<double>> values, DistributionCall call, DiagnosticList diagnostics)
    {
        DistributionBinding binding = form.Bind(new BoundArguments(values));
        foreach (ParameterProblem problem in binding.Problems)
        {
            CallArgument? argument = call.Arguments.FirstOrDefault(a => a.Name == problem.Parameter);
            diagnostics.Error(argument?.Position ?? call.Position, problem.Message, problem.Hint);
        }

        return binding.Distribution;
    }
}
