namespace SurveyPlanner.Numerics;

/// <summary>
/// Philox 4x32-10, a counter-based random generator.
/// Source: Salmon, Moraes, Dror, Shaw 2011, Parallel random numbers: as easy as 1, 2, 3 (SC'11); held to the authors' known answers in the tests.
/// </summary>
public static class Philox
{
    private const uint Multiplier0 = 0xD2511F53;
    private const uint Multiplier1 = 0xCD9E8D57;
    private const uint Weyl0 = 0x9E3779B9;
    private const uint Weyl1 = 0xBB67AE85;
    private const int Rounds = 10;

    /// <summary>Four random words for a counter of four words and a key of two.</summary>
    public static (uint W0, uint W1, uint W2, uint W3) Block(uint c0, uint c1, uint c2, uint c3, uint k0, uint k1)
    {
        for (var round = 0; round < Rounds; round++)
        {
            var product0 = (ulong)Multiplier0 * c0;
            var product1 = (ulong)Multiplier1 * c2;
            (c0, c1, c2, c3) = (
                (uint)(product1 >> 32) ^ c1 ^ k0,
                (uint)product1,
                (uint)(product0 >> 32) ^ c3 ^ k1,
                (uint)product0);
            k0 += Weyl0;
            k1 += Weyl1;
        }

        return (c0, c1, c2, c3);
    }
}

/// <summary>What random numbers are drawn for; the first word of the counter, so that no two uses ever share numbers.</summary>
public static class RandomPurpose
{
    /// <summary>The layout that will be surveyed.</summary>
    public const uint Layout = 1;

    /// <summary>Simulated draws for coverage probability.</summary>
    public const uint Coverage = 2;

    /// <summary>Bootstrap of a pilot.</summary>
    public const uint Bootstrap = 3;

    /// <summary>Simulated series for trend power.</summary>
    public const uint Trend = 4;

    /// <summary>Integration of expected effort over the random offset.</summary>
    public const uint Expectation = 5;

    /// <summary>What a pilot leaves possible of its own figures.</summary>
    public const uint PilotDraw = 6;
}

/// <summary>
/// A stream of random numbers at one place of the counter: key = seed, counter = purpose, stratum, replicate, draw.
/// Replicate 731 can be redone alone, and no result depends on threads or order.
/// </summary>
public struct PhiloxStream(ulong seed, uint purpose, uint stratum, uint replicate)
{
    private uint _draw;
    private ulong _spare;
    private bool _hasSpare;

    /// <summary>64 random bits.</summary>
    public ulong NextBits()
    {
        if (_hasSpare)
        {
            _hasSpare = false;
            return _spare;
        }

        var (w0, w1, w2, w3) = Philox.Block(purpose, stratum, replicate, _draw++, (uint)seed, (uint)(seed >> 32));
        _spare = ((ulong)w3 << 32) | w2;
        _hasSpare = true;
        return ((ulong)w1 << 32) | w0;
    }

    /// <summary>Uniform in [0, 1), 53 bits.</summary>
    public double NextDouble() => (NextBits() >> 11) * (1.0 / (1UL << 53));

    /// <summary>Uniform whole number in [0, bound), without bias (rejection).</summary>
    public uint NextBelow(uint bound)
    {
        ArgumentOutOfRangeException.ThrowIfZero(bound);
        var limit = ulong.MaxValue - (ulong.MaxValue % bound);
        ulong bits;
        do
        {
            bits = NextBits();
        }
        while (bits >= limit);
        return (uint)(bits % bound);
    }
}
