namespace Swarm.Engine.Models;

/// <summary>Bounds on a model document: a hostile one costs neither time nor memory.</summary>
internal static class ModelBounds
{
    /// <summary>Characters of the document.</summary>
    public const int TextLength = 1 << 20;

    /// <summary>Depth of mappings and lists in each other.</summary>
    public const int Nesting = 32;

    /// <summary>Nodes of the document, those that aliases repeat counted each time.</summary>
    public const int Nodes = 100_000;

    /// <summary>Draws, formulas and quantities of components together.</summary>
    public const int Quantities = 10_000;

    /// <summary>Last step.</summary>
    public const int Horizon = 10_000;

    /// <summary>Quantities with <c>[t]</c> times steps.</summary>
    public const int QuantitySteps = 1_000_000;

    /// <summary>References of formulas with <c>[t]</c> times steps: what sorting the quantities costs.</summary>
    public const long ReferenceSteps = 20_000_000;

    /// <summary>Reported values, each step of an outcome with <c>[t]</c> counted.</summary>
    public const int ReportedValues = 10_000;

    /// <summary>Characters of a formula.</summary>
    public const int FormulaLength = 10_000;

    /// <summary>Depth of brackets in a formula.</summary>
    public const int FormulaNesting = 200;

    /// <summary>Depth of a formula's tree: a sum of n terms is n deep.</summary>
    public const int FormulaHeight = 1_000;

    /// <summary>Characters of a name.</summary>
    public const int NameLength = 100;

    /// <summary>Characters of the title and of other free text.</summary>
    public const int FreeTextLength = 200;

    /// <summary>Entries of a list of numbers.</summary>
    public const int ListLength = 1_000;

    /// <summary>Bytes of a data file.</summary>
    public const int DataFileBytes = 64 << 20;

    /// <summary>Errors that are told, and warnings likewise.</summary>
    public const int Diagnostics = 100;
}
