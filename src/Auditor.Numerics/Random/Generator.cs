using System.Numerics;

namespace Auditor.Numerics.Random;

/// <summary>A stream of random numbers of its own for each key, so that results do not depend on which thread draws when.</summary>
/// <remarks>
/// xoshiro256** by Blackman and Vigna 2021, ACM Transactions on Mathematical Software 47, its state filled by splitmix64 as they advise (from memory);
/// normal numbers by Box and Muller 1958.
/// </remarks>
public sealed class Generator
{
    private const double Unit = 1.0 / (1UL << 53);

    private readonly ulong[] _state = new ulong[4];
    private double? _kept;

    public Generator(params ReadOnlySpan<ulong> key)
    {
        var mixed = 0UL;
        foreach (var part in key)
        {
            mixed = Mix(ref mixed) ^ part;
        }

        for (var i = 0; i < _state.Length; i++)
        {
            _state[i] = Mix(ref mixed);
        }
    }

    /// <summary>Above 0 and below 1.</summary>
    public double Uniform() => ((Next() >> 11) + 0.5) * Unit;

    public double Normal()
    {
        if (_kept is double kept)
        {
            _kept = null;
            return kept;
        }

        var radius = Math.Sqrt(-2 * Math.Log(Uniform()));
        var (sine, cosine) = Math.SinCos(2 * Math.PI * Uniform());
        _kept = radius * sine;
        return radius * cosine;
    }

    private static ulong Mix(ref ulong state)
    {
        state += 0x9E3779B97F4A7C15;
        var z = (state ^ (state >> 30)) * 0xBF58476D1CE4E5B9;
        z = (z ^ (z >> 27)) * 0x94D049BB133111EB;
        return z ^ (z >> 31);
    }

    private ulong Next()
    {
        var result = BitOperations.RotateLeft(_state[1] * 5, 7) * 9;
        var shifted = _state[1] << 17;
        _state[2] ^= _state[0];
        _state[3] ^= _state[1];
        _state[1] ^= _state[2];
        _state[0] ^= _state[3];
        _state[2] ^= shifted;
        _state[3] = BitOperations.RotateLeft(_state[3], 45);
        return result;
    }
}
