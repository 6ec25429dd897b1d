using CsCheck;
using MathNet.Numerics.Distributions;
using MathNet.Numerics.Random;
using UnitsNet;

namespace FiberScope.Fibres.Tests;

public sealed class DiameterSurveyTests
{
    private static readonly SurveySettings SamplingOnly = new() { ScaleRelativeUncertainty = 0 };

    [Fact]
    public void Length_and_number_weighting_differ_as_they_must()
    {
        var survey = DiameterSurvey.From([Reading(1, 9, 0), Reading(3, 1, 1)], SamplingOnly);
        Assert.Equal(1.2, survey.LengthWeighted.Mean.Micrometers, 1e-9);
        Assert.Equal(2.0, survey.NumberWeighted.Mean.Micrometers, 1e-9);
    }

    [Fact]
    public void Scaling_the_pixel_scales_every_figure() =>
        Gen.Double[0.1, 10].Sample(factor =>
        {
            var (one, other) = (DiameterSurvey.From(Swatch(1, 1), SamplingOnly), DiameterSurvey.From(Swatch(1, factor), SamplingOnly));
            Assert.Equal(one.LengthWeighted.Mean.Micrometers * factor, other.LengthWeighted.Mean.Micrometers, 1e-9 * factor);
            Assert.Equal(one.D90Interval95.High.Micrometers * factor, other.D90Interval95.High.Micrometers, 1e-6 * factor);
            Assert.Equal(one.MeanInterval95.High.Micrometers * factor, other.MeanInterval95.High.Micrometers, 1e-6 * factor);
        }, iter: 10);

    [Fact]
    public void Scale_and_edge_widen_the_interval_as_squares()
    {
        var readings = Swatch(2, 1);
        var plain = DiameterSurvey.From(readings, SamplingOnly);
        var full = DiameterSurvey.From(readings, new SurveySettings { ScaleRelativeUncertainty = 0.02, EdgeUncertainty = Length.FromNanometers(50) });
        var mean = plain.LengthWeighted.Mean.Micrometers;
        var expected = Math.Sqrt(Math.Pow(plain.Budget.Combined.Micrometers, 2) + Math.Pow(0.02 * mean, 2) + Math.Pow(0.05, 2));
        Assert.Equal(expected, full.Budget.Combined.Micrometers, 1e-9);
    }

    [Fact]
    public void The_interval_of_the_mean_covers_the_truth_as_often_as_it_says()
    {
        // Fields of one mat, each with its own level: log-normal fibres, CV between fields 8 %. Truth: exp of half the log-variances.
        const int Swatches = 200;
        var truth = 2 * Math.Exp((0.4 * 0.4 / 2) + (0.08 * 0.08 / 2));
        var covered = Enumerable.Range(0, Swatches).Count(seed =>
            DiameterSurvey.From(Swatch(seed, 1), new SurveySettings { ScaleRelativeUncertainty = 0, BootstrapReplicates = 100 })
                .MeanInterval95.Contains(Length.FromMicrometers(truth)));
        Assert.InRange(covered / (double)Swatches, 0.90, 0.99);
    }

    [Fact]
    public void More_fields_are_needed_for_a_narrower_interval()
    {
        var survey = DiameterSurvey.From(Swatch(3, 1), SamplingOnly);
        Assert.True(survey.FieldsNeededFor(0.02) > survey.FieldsNeededFor(0.08));
    }

    [Fact]
    public void An_interval_narrower_than_the_scale_allows_cannot_be_planned() =>
        Assert.Null(DiameterSurvey.From(Swatch(3, 1), new SurveySettings { ScaleRelativeUncertainty = 0.02 }).FieldsNeededFor(0.03));

    [Fact]
    public void One_field_alone_is_flagged() =>
        Assert.Contains(DiameterSurvey.From([Reading(1, 1, 0)], SamplingOnly).Caveats, caveat => caveat.Code == "few-fields");

    [Fact]
    public void The_same_input_gives_the_same_intervals()
    {
        var readings = Swatch(5, 1);
        Assert.Equal(DiameterSurvey.From(readings, SamplingOnly).D10Interval95, DiameterSurvey.From(readings, SamplingOnly).D10Interval95);
    }

    private static DiameterReading Reading(double micrometres, double length, int fibre, int field = 0) =>
        new(Length.FromMicrometers(micrometres), Length.Zero, Length.FromMicrometers(length), fibre, field);

    private static DiameterReading[] Swatch(int seed, double factor)
    {
        var random = new Xoshiro256StarStar(seed, threadSafe: false);
        var readings = new List<DiameterReading>();
        for (var field = 0; field < 5; field++)
        {
            var level = Normal.Sample(random, 0, 0.08);
            for (var fibre = 0; fibre < 60; fibre++)
            {
                var diameter = 2 * Math.Exp(level + Normal.Sample(random, 0, 0.4)) * factor;
                readings.Add(Reading(diameter, 5 * factor, fibre, field));
                readings.Add(Reading(diameter, 5 * factor, fibre, field));
            }
        }

        return [.. readings];
    }
}
