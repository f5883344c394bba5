using System.Runtime.Intrinsics;
using RuleAndCompass.Accuracy;
using RuleAndCompass.Bench.Errors;

namespace RuleAndCompass.Tests.Accuracy;

public sealed class RandomNumbersTests
{
    // The authors' known answers for threefry2x32 with 20 rounds (Random123, kat_vectors), from memory: key, counter, result. The generator can't
    // give these by chance, so remembering them wrongly would fail here.
    [Theory]
    [InlineData(0x0000000000000000, 0x00000000u, 0x00000000u, 0x6b200159u, 0x99ba4efeu)]
    [InlineData(0xffffffffffffffff, 0xffffffffu, 0xffffffffu, 0x1cb996fcu, 0xbb002be7u)]
    [InlineData(0x0370734413198a2e, 0x243f6a88u, 0x85a308d3u, 0xc4923a9cu, 0x483df7a0u)]
    public void Bits_are_those_the_authors_published(ulong key, uint counter0, uint counter1, uint first, uint second)
    {
        (Vector256<uint> x, Vector256<uint> y) = Threefry.Bits(key, Vector256.Create(counter0), counter1);

        x.ShouldBe(Vector256.Create(first));
        y.ShouldBe(Vector256.Create(second));
    }

    [Fact]
    public void A_number_depends_on_its_own_trial_and_draw_alone()
    {
        (Vector256<double> first, _, Vector256<double> later, _) = NormalNumbers.Draw(7, 0, 5);

        NormalNumbers.Draw(7, 4, 5).First.ShouldBe(later);
        NormalNumbers.Draw(7, 3, 5).First[0].ShouldBe(first[3]);
        NormalNumbers.Draw(8, 0, 5).First.ShouldNotBe(first);
        NormalNumbers.Draw(7, 0, 6).First.ShouldNotBe(first);
    }

    [Fact]
    public void Numbers_are_normal_and_the_two_of_a_pair_independent()
    {
        const int Count = 400_000;
        double sum = 0, squares = 0, fourth = 0, together = 0;
        int within = 0;
        for (uint trial = 0; trial < Count; trial += 8)
        {
            (Vector256<double> a, Vector256<double> b, _, _) = NormalNumbers.Draw(1, trial, 3);
            for (int lane = 0; lane < 4; lane++)
            {
                sum += a[lane];
                squares += a[lane] * a[lane];
                fourth += Math.Pow(a[lane], 4);
                together += a[lane] * b[lane];
                within += Math.Abs(a[lane]) < 1.959964 ? 1 : 0;
            }
        }

        // Moments of the normal distribution: 0, 1, 3; each bound is five standard errors of 200,000 draws.
        const double Draws = Count / 2.0;
        (sum / Draws).ShouldBe(0, 5 / Math.Sqrt(Draws));
        (squares / Draws).ShouldBe(1, 5 * Math.Sqrt(2 / Draws));
        (fourth / Draws).ShouldBe(3, 5 * Math.Sqrt(96 / Draws));
        (together / Draws).ShouldBe(0, 5 / Math.Sqrt(Draws));
        (within / Draws).ShouldBe(0.95, 5 * Math.Sqrt(0.95 * 0.05 / Draws));
    }

    // Any machine must give these bits: the lanes use nothing that IEEE 754 leaves open. Worked out in the language's own scalar operations, one
    // lane at a time, without vectors.
    [Fact]
    public void Lanes_give_the_bits_of_scalar_arithmetic()
    {
        foreach (double turns in new[] { 0.0, 0.1, -0.3, 0.4999, 2.75 })
        {
            double shifted = turns * 4.0 + 6755399441055744.0;
            ulong quadrant = BitConverter.DoubleToUInt64Bits(shifted);
            double x = (turns - (shifted - 6755399441055744.0) * 0.25) * Math.Tau;
            double z = x * x;
            double sine = x + x * z * (-1.66666666666666324348e-01 + z * (8.33333333332248946124e-03 + z * (-1.98412698298579493134e-04
                + z * (2.75573137070700676789e-06 + z * (-2.50507602534068634195e-08 + z * 1.58969099521155010221e-10)))));
            double cosine = 1.0 - (z * 0.5 - z * z * (4.16666666666666019037e-02 + z * (-1.38888888888741095749e-03 + z * (2.48015872894767294178e-05
                + z * (-2.75573143513906633035e-07 + z * (2.08757232129817482790e-09 + z * -1.13596475577881948265e-11))))));
            double expected = (quadrant & 1) == 0 ? sine : cosine;
            if ((quadrant & 2) != 0)
                expected = -expected;

            Lanes.SineCosine(Vector256.Create(turns)).Sine[2].ShouldBe(expected);
        }
    }

    [Fact]
    public void Elementary_functions_agree_with_the_platforms()
    {
        Random random = new(3);
        for (int round = 0; round < 20_000; round++)
        {
            double turns = (random.NextDouble() - 0.5) * 8;
            (Vector256<double> sine, Vector256<double> cosine) = Lanes.SineCosine(Vector256.Create(turns));
            sine[0].ShouldBe(Math.Sin(turns * Math.Tau), 1e-14);
            cosine[0].ShouldBe(Math.Cos(turns * Math.Tau), 1e-14);

            double positive = Math.Exp((random.NextDouble() - 0.5) * 200);
            Lanes.Logarithm(Vector256.Create(positive))[0].ShouldBe(Math.Log(positive), 1e-13);

            double x = random.NextDouble() - 0.5;
            double y = Math.ScaleB(random.NextDouble() - 0.5, random.Next(-30, 10));
            Lanes.Angle(Vector256.Create(y), Vector256.Create(x))[0].ShouldBe(Math.Atan2(y, x), 1e-15 * Math.PI);
        }
    }

    [Fact]
    public void The_angle_of_axes_is_exact_and_loss_passes_through()
    {
        Lanes.Angle(Vector256.Create(0.0), Vector256.Create(0.0))[0].ShouldBe(0);
        Lanes.Angle(Vector256.Create(1.0), Vector256.Create(0.0))[0].ShouldBe(Math.PI / 2);
        Lanes.Angle(Vector256.Create(0.0), Vector256.Create(-1.0))[0].ShouldBe(Math.PI);
        double.IsNaN(Lanes.Angle(Vector256.Create(double.NaN), Vector256.Create(1.0))[0]).ShouldBeTrue();
        double.IsNaN(Lanes.Angle(Vector256.Create(1.0), Vector256.Create(double.NaN))[0]).ShouldBeTrue();
    }
}
