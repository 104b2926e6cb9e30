using System.Globalization;
using Swarm.Engine.Numerics;
using Swarm.Engine.Streams;

namespace Swarm.Engine.Tests.Streams;

public sealed unsafe class PhiloxTests
{
    public static TheoryData<string> KnownAnswers => [.. TestFile.Lines("philox4x32-10.txt")];

    [Theory]
    [MemberData(nameof(KnownAnswers))]
    public void Philox_gives_the_published_words_at_every_width(string line)
    {
        uint[] words = [.. line.Split(' ').Select(word => uint.Parse(word, NumberStyles.HexNumber, CultureInfo.InvariantCulture))];
        var key = new StreamKey(words[4] | ((ulong)words[5] << 32));

        Assert.Equal(words[6..], Generate<Lanes512>(words, key));
        Assert.Equal(words[6..], Generate<Lanes256>(words, key));
        Assert.Equal(words[6..], Generate<Lanes128>(words, key));
        Assert.Equal(words[6..], Generate<Lanes64>(words, key));
    }

    [Fact]
    public void A_counter_keeps_its_fields_apart()
    {
        var seen = new HashSet<(uint, uint, uint, uint)>();
        long[] trials = [0, 1, (1L << 32) - 1, 1L << 32, (1L << 48) - 1];
        foreach (long trial in trials)
        {
            foreach (int step in (int[])[0, 1, Counter.MaxStep])
            {
                foreach (long item in (long[])[0, 1, 1L << 32, Counter.MaxItem])
                {
                    foreach (int attempt in (int[])[0, 1, Counter.SideAttempt])
                    {
                        Assert.True(seen.Add(WordsOf(trial, step, item, attempt)));
                    }
                }
            }
        }
    }

    [Fact]
    public void Seed_role_and_name_all_change_the_key()
    {
        StreamKey key = StreamKey.Of(1, "draw", "equity");

        Assert.NotEqual(key, StreamKey.Of(2, "draw", "equity"));
        Assert.NotEqual(key, StreamKey.Of(1, "size", "equity"));
        Assert.NotEqual(key, StreamKey.Of(1, "draw", "equity2"));
        Assert.NotEqual(StreamKey.Of(1, "ab", "c"), StreamKey.Of(1, "a", "bc"));
        Assert.Equal(key, StreamKey.Of(1, "draw", "equity"));
    }

    private static (uint C0, uint C1, uint C2, uint C3) WordsOf(long trial, int step, long item, int attempt)
    {
        ulong second = BitConverter.DoubleToUInt64Bits(
            Counter.Word1(Lanes64.CreateBits((ulong)trial), step).Value);
        return ((uint)trial, (uint)second, (uint)Counter.Word2(item), (uint)Counter.Word3(item, attempt));
    }

    private static uint[] Generate<V>(uint[] words, StreamKey key)
        where V : unmanaged, ILanes<V>
    {
        ulong* keys = stackalloc ulong[Philox4x32.KeyWords];
        Philox4x32.ExpandKey(key, keys);
        V c0 = V.CreateBits(words[0]);
        V c1 = V.CreateBits(words[1]);
        V c2 = V.CreateBits(words[2]);
        V c3 = V.CreateBits(words[3]);
        Philox4x32.Generate(keys, ref c0, ref c1, ref c2, ref c3);
        return [LastLane(c0), LastLane(c1), LastLane(c2), LastLane(c3)];
    }

    private static uint LastLane<V>(V word)
        where V : unmanaged, ILanes<V>
    {
        double* lanes = stackalloc double[V.Count];
        V.Store(word, lanes);
        return (uint)BitConverter.DoubleToUInt64Bits(lanes[V.Count - 1]);
    }
}
