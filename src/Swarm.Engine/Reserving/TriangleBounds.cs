namespace Swarm.Engine.Reserving;

/// <summary>How large a triangle may be.</summary>
internal static class TriangleBounds
{
    public const int Origins = 200;
    public const int Developments = 200;
    public const int Cells = Origins * Developments;
}
