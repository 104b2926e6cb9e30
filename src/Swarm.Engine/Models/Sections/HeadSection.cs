using Swarm.Engine.Models.Documents;
using Swarm.Engine.Models.Shapes;

namespace Swarm.Engine.Models.Sections;

/// <summary>The document's head: <c>model</c>, <c>money</c>, <c>horizon</c>.</summary>
internal static class HeadSection
{
    public static TextShape TitleShape { get; } = new("Title of the model, shown with its figures.");

    public static ObjectShape MoneyShape { get; } = new(
        "Unit of money, shown with figures. The engine does not convert anything.",
        [
            new Field("unit", new TextShape("Name of the unit, as in crown.")) { IsRequired = true },
            new Field(
                "scale",
                new NumberShape("How many units one number of the model stands for, as in 1000 (default 1).") { Above = 0 }),
        ]);

    public static NumberShape HorizonShape { get; } =
        new("Last step of quantities with [t]: they exist for steps 1 to horizon.") { IsWhole = true, Least = 1, Most = ModelBounds.Horizon };

    public static Money? ReadMoney(MappingNode root)
    {
        MappingNode? money = root.Mapping("money");
        return money.Text("unit") is { } unit ? new Money(unit, money.Number("scale") ?? 1) : null;
    }

    /// <summary>The last step; 0 where there is none, null where it is wrong.</summary>
    public static int? ReadHorizon(MappingNode root)
    {
        if (root["horizon"] is null)
        {
            return 0;
        }

        return root.Whole("horizon") is int horizon and >= 1 and <= ModelBounds.Horizon ? horizon : null;
    }
}
