using DiagnosticAccuracy.Numerics;
using FsCheck;
using FsCheck.Xunit;

namespace DiagnosticAccuracy.Tests.Numerics;

public class SortingTests
{
    public static TheoryData<string, int> Shapes()
    {
        TheoryData<string, int> data = [];
        foreach (string shape in new[] { "uniform", "normal", "ties", "sorted", "reversed", "low bits", "one value", "two clusters", "all bits" })
        {
            foreach (int n in new[] { 0, 1, 2, 255, 256, 257, 5000, 70000 })
            {
                data.Add(shape, n);
            }
        }

        return data;
    }

    [Theory]
    [MemberData(nameof(Shapes))]
    public void Keys_come_out_as_Array_Sort_puts_them_and_indices_with_them(string shape, int n)
    {
        Random random = new(n);
        double[] scores = new double[n];
        for (int i = 0; i < n; i++)
        {
            scores[i] = shape switch
            {
                "uniform" => random.NextDouble(),
                "normal" => Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble()),
                "ties" => Math.Round(random.NextDouble(), 1),
                "sorted" => i,
                "reversed" => -i,
                "low bits" => BitConverter.Int64BitsToDouble(BitConverter.DoubleToInt64Bits(1.0) + random.Next(0, 5000)),
                "one value" => 3.5,
                "two clusters" => (random.Next(2) * 1e300) + BitConverter.Int64BitsToDouble(random.Next()),
                _ => AnyDouble(random),
            };
        }

        ulong[] keys = [.. scores.Select(OrderedKey.Of)];
        int[] indices = [.. Enumerable.Range(0, n)];
        ulong[] alone = [.. keys];
        RadixSort.Sort(keys, indices, new ulong[n], new int[n]);
        RadixSort.Sort(alone, new ulong[n]);
        double[] expected = [.. scores.Select(x => x + 0.0)];
        Array.Sort(expected);
        Assert.Equal(expected, keys.Select(OrderedKey.ToDouble));
        Assert.Equal(expected, alone.Select(OrderedKey.ToDouble));
        Assert.Equal(expected, indices.Select(i => scores[i] + 0.0));
        Assert.Equal(n, indices.Distinct().Count());
    }

    [Property(MaxTest = 1000)]
    public void Keys_keep_the_order_and_come_back(double left, double right)
    {
        if (double.IsNaN(left) || double.IsNaN(right))
        {
            return;
        }

        Assert.Equal(left.CompareTo(right) is 0 ? 0 : Math.Sign(left.CompareTo(right)), (left + 0.0 == right + 0.0) ? 0 : Math.Sign(OrderedKey.Of(left).CompareTo(OrderedKey.Of(right))));
        Assert.Equal(left, OrderedKey.ToDouble(OrderedKey.Of(left)));
        Assert.NotEqual(ulong.MaxValue, OrderedKey.Of(left));
        Assert.NotEqual(0UL, OrderedKey.Of(left));
    }

    private static double AnyDouble(Random random)
    {
        byte[] bytes = new byte[8];
        random.NextBytes(bytes);
        double value = BitConverter.ToDouble(bytes, 0);
        return double.IsNaN(value) ? 0 : value;
    }
}
