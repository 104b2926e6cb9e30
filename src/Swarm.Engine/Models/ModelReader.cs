using Swarm.Engine.Distributions;
using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Names;
using Swarm.Engine.Models.Sections;
using Swarm.Engine.Models.Shapes;
using Swarm.Engine.Reserving;

namespace Swarm.Engine.Models;

/// <summary>Reads a model document: YAML in, a fully checked model or all that is wrong with it out.</summary>
public static class ModelReader
{
    /// <summary>Reads a document with every distribution and data format that the engine knows.</summary>
    /// <param name="fileName">Name of the document for messages.</param>
    /// <param name="text">Its text.</param>
    /// <param name="data">Finds a data file by the name that the model writes; null if there is none.</param>
    public static ModelReading Read(string fileName, string text, Func<string, DataFile?> data) =>
        Read(fileName, text, data, DistributionCatalogue.Forms, TriangleReader.Read);

    /// <summary>Reads a document.</summary>
    /// <param name="fileName">Name of the document for messages.</param>
    /// <param name="text">Its text.</param>
    /// <param name="data">Finds a data file by the name that the model writes; null if there is none.</param>
    /// <param name="forms">Distributions that draws may have.</param>
    /// <param name="triangles">Reads a triangle out of a data file.</param>
    public static ModelReading Read(
        string fileName,
        string text,
        Func<string, DataFile?> data,
        IReadOnlyList<DistributionForm> forms,
        Func<TriangleRequest, (Triangle? Triangle, IReadOnlyList<Diagnostic> Diagnostics)> triangles)
    {
        DiagnosticList diagnostics = new();
        DataFiles files = new(data);
        Model? model = Root(fileName, text, diagnostics) is { } root ? Read(root, diagnostics, files, forms, triangles) : null;
        return new ModelReading(diagnostics.HasErrors ? null : model, diagnostics.InOrder(fileName), files.Found);
    }

    private static MappingNode? Root(string fileName, string text, DiagnosticList diagnostics)
    {
        if (text.Length > ModelBounds.TextLength)
        {
            diagnostics.Error(
                new SourcePosition(fileName, 1, 1), $"the document is longer than {ModelBounds.TextLength:N0} characters", "keep data in data files");
            return null;
        }

        if (DocumentParser.Parse(new SourceText(fileName, text), diagnostics) is not { } node)
        {
            return null;
        }

        new StructureCheck(diagnostics).Check(node, ModelShape.Document, "the model");
        return diagnostics.IsFull ? null : node as MappingNode;
    }

    private static Model Read(
        MappingNode root,
        DiagnosticList diagnostics,
        DataFiles files,
        IReadOnlyList<DistributionForm> forms,
        Func<TriangleRequest, (Triangle? Triangle, IReadOnlyList<Diagnostic> Diagnostics)> triangles)
    {
        ReadingContext context = new()
        {
            Start = root.Position,
            Diagnostics = diagnostics,
            Forms = forms,
            Data = files,
            Names = new NameTable(diagnostics) { IsIncomplete = ModelShape.LosesNames(root) },
            Horizon = HeadSection.ReadHorizon(root),
        };

        // Components first: their quantities' names are taken before draws and formulas choose theirs.
        IReadOnlyList<TriangleInput> inputs = new TrianglesSection(context, triangles).Read(root);
        IReadOnlyList<Draw> draws = DrawsSection.Read(root, context);
        IReadOnlyList<Formula> formulas = FormulasSection.Read(root, context);
        FormulaSetCheck.Check(formulas, context);
        Model model = new()
        {
            Title = root.Text("model") ?? "",
            Money = HeadSection.ReadMoney(root),
            Horizon = context.Horizon ?? 0,
            Draws = draws,
            Formulas = formulas,
            Triangles = inputs,
            Outcomes = new OutcomesSection(context, new TruthInference(formulas)).Read(root),
        };
        if (!diagnostics.HasErrors)
        {
            UseCheck.Check(model, context.Names, diagnostics);
        }

        return model;
    }
}
