namespace Swarm.Engine.Streams;

/// <summary>Which random numbers a kernel is to use: a stream, a run of trials from <paramref name="FirstTrial"/> on, a step.</summary>
/// <param name="Key">Key of the stream.</param>
/// <param name="FirstTrial">First trial of the run, a multiple of 16.</param>
/// <param name="Step">Step, 0 for a value that exists once per trial.</param>
/// <param name="Width">Vector width to compute at; it does not change the bits.</param>
internal readonly record struct DrawSlice(StreamKey Key, long FirstTrial, int Step, Numerics.LaneWidth Width);
