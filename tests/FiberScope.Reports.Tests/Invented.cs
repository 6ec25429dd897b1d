using System.Collections.Immutable;
using FiberScope.Assessment;
using FiberScope.Conformity;
using FiberScope.Fibres;
using FiberScope.Filtration;
using FiberScope.Imaging;
using FiberScope.Statistics;
using UnitsNet;

namespace FiberScope.Reports.Tests;

/// <summary>An assessment made up from a seed, with every part that a report can show. No real material looks like this.</summary>
internal static class Invented
{
    private const int Width = 640;
    private const int Height = 480;

    public static SwatchAssessment Assessment(string lot = "L-0417", int fields = 5)
    {
        var random = new Random(7);
        var findings = Enumerable.Range(1, fields).Select(n => Field(n, random)).ToImmutableArray();
        var readings = findings.Where(f => f.IsIncluded).SelectMany(f => f.Measurement.Readings.Select(r => new DiameterReading(
            Length.FromNanometers(r.Diameter * 50), Length.FromNanometers(20), Length.FromNanometers(r.RepresentedLength * 50), r.Trace, f.Number)));
        var survey = DiameterSurvey.From(readings, new SurveySettings { BootstrapReplicates = 100, EdgeUncertainty = Length.FromNanometers(15) });
        var forecast = Forecast();
        var weighing = new SolidityEstimate(SolidityRoute.Weighing, new Solidity(0.079), 0.006, "Basis weight 25 g/m² over density and thickness.");
        var section = new SolidityEstimate(SolidityRoute.CrossSection, new Solidity(0.084), 0.005, "Area share of fibre in three sections.");
        return new SwatchAssessment
        {
            Identity = new SwatchIdentity { Title = $"Invented melt-blown web, {lot}", Material = "Invented melt-blown web", Lot = lot, Roll = "12", Swatch = "A", MachineDirectionPosition = "310 m", CrossDirectionPosition = "centre", Note = "made up for a test" },
            Layers =
            [
                new LayerFinding
                {
                    Name = "",
                    Fields = findings,
                    Survey = survey,
                    Solidity = SolidityFinding.Combine([weighing, section]),
                    PolymerName = "polypropylene",
                    FibreDensity = Density.FromKilogramsPerCubicMeter(905),
                    BasisWeight = AreaDensity.FromGramsPerSquareMeter(25),
                    Thickness = Length.FromMillimeters(0.35),
                },
            ],
            Forecast = forecast,
            VelocitySweep = [.. Enumerable.Range(1, 20).Select(i => Sweep(i))],
            AirPermeabilities = [new(Pressure.FromPascals(125), Speed.FromMillimetersPerSecond(161)), new(Pressure.FromPascals(200), Speed.FromMillimetersPerSecond(258))],
            Classes = [Class()],
            Challenges = [new("invented mist", new ChallengeAerosol(Length.FromNanometers(75), 1.86, AerosolBasis.Mass), Speed.FromCentimetersPerSecond(9.4), false, new(0.034, new(0.02, 0.06), new(0.03, 0.04)), 0.055)],
            Bands = [new(Length.FromMicrometers(1), Length.FromMicrometers(3), new(1.35e-6, new(1e-9, 4e-6), null))],
            TotalInwardLeakage = 0.0653,
            RigPoints = [new(Speed.FromCentimetersPerSecond(5.3), Pressure.FromPascals(44), Length.FromMicrometers(0.3), 0.031, Pressure.FromPascals(41), 0.027)],
            Verdict = Verdict(survey, forecast),
            Recipe = Recipe(findings),
            Caveats = [.. survey.Caveats, new Caveat("invented", "Everything in this assessment is invented.")],
        };
    }

    private static FieldFinding Field(int number, Random random)
    {
        var grey = new float[Width * Height];
        for (var i = 0; i < grey.Length; i++)
        {
            grey[i] = 0.12f + (0.08f * (float)random.NextDouble());
        }

        var traces = ImmutableArray.CreateBuilder<Trace>();
        var readings = ImmutableArray.CreateBuilder<PixelReading>();
        for (var id = 0; id < 24; id++)
        {
            Fibre(id, random, grey, traces, readings);
        }

        var fit = number != 4;
        return new FieldFinding
        {
            Number = number,
            Name = FormattableString.Invariant($"images/field-{number}.png"),
            Measurement = new FieldMeasurement
            {
                Micrograph = new Micrograph(grey, Width, Height, Length.FromNanometers(50), ImagingMode.SecondaryElectron, new MicrographSource(FormattableString.Invariant($"images/field-{number}.png"), new string('a', 64), 0, 8, "swatch file"), 40),
                Fitness = new FieldFitness([new FitnessCheck("focus", fit ? 1.1 : 3.9, 2.5, fit, "blur, pixels", "Focus again at this magnification."), new FitnessCheck("saturation", 0.4, 2, true, "share of clipped pixels, %", "Lower the contrast.")]),
                Traces = traces.ToImmutable(),
                Readings = readings.ToImmutable(),
                Rejected = ImmutableSortedDictionary<string, int>.Empty.Add("one-edge-hidden", 211).Add("crossing", 84),
                Defects = [new DefectRegion(DefectKind.Shot, 380, [(300, 200), (320, 205), (322, 222), (302, 220)]), new DefectRegion(DefectKind.Film, 2100, [(80, 60), (140, 70), (130, 110), (76, 96)])],
                DetectionLimitPixels = 3.2,
                BlurPixels = fit ? 1.1 : 3.9,
                Algorithm = "invented@1",
            },
            LengthWeighted = null,
            NumberWeighted = null,
            LeftOutBecause = fit ? null : "the picture is out of focus.",
        };
    }

    private static void Fibre(int id, Random random, float[] grey, ImmutableArray<Trace>.Builder traces, ImmutableArray<PixelReading>.Builder readings)
    {
        var radius = 0.5 * 30 * Math.Exp(0.45 * Normal(random));
        var angle = Math.PI * random.NextDouble();
        var (x, y) = (Width * random.NextDouble(), Height * random.NextDouble());
        var (cos, sin) = (Math.Cos(angle), Math.Sin(angle));
        var line = ImmutableArray.CreateBuilder<TracePoint>();
        for (var s = -400.0; s <= 400; s += 4)
        {
            var (px, py) = (x + (s * cos), y + (s * sin));
            if (px is > 0 and < Width && py is > 0 and < Height - 40)
            {
                line.Add(new TracePoint(px, py, radius));
                for (var t = -radius; t <= radius; t += 0.5)
                {
                    for (var d = 0; d < 4; d++)
                    {
                        var (qx, qy) = ((int)(px + (d * cos) - (t * sin)), (int)(py + (d * sin) + (t * cos)));
                        if (qx is >= 0 and < Width && qy is >= 0 and < Height)
                        {
                            grey[(qy * Width) + qx] = (float)(0.45 + (0.4 * Math.Pow(Math.Abs(t) / radius, 4)));
                        }
                    }
                }

                if (line.Count % 5 == 0)
                {
                    readings.Add(new PixelReading(px, py, angle, 2 * radius * (1 + (0.02 * Normal(random))), 0.4, 20, id));
                }
            }
        }

        if (line.Count > 1)
        {
            traces.Add(new Trace(id, line.ToImmutable()));
        }
    }

    private static MediaForecast Forecast()
    {
        CurvePoint Point(int i)
        {
            var micrometres = 0.01 * Math.Pow(1000, i / 59.0);
            var diffusion = 0.9 * Math.Pow(0.1 / micrometres, 0.67);
            var interception = 3.2 * Math.Pow(micrometres, 1.4);
            var impaction = 1.5 * micrometres * micrometres;
            var all = 2 + diffusion + interception + impaction;
            var p = Math.Exp(-all);
            return new CurvePoint
            {
                Particle = Length.FromMicrometers(micrometres),
                Penetration = p,
                ModelBand = new Interval(Math.Exp(-all * 1.25), Math.Exp(-all * 0.9)),
                MeasurementBand = new Interval(Math.Exp(-all * 1.1), Math.Exp(-all * 0.91)),
                ByMechanism = ImmutableSortedDictionary<string, double>.Empty.Add("diffusion", (diffusion + 1) / all).Add("interception", (interception + 1) / all).Add("impaction", impaction / all),
            };
        }

        ImmutableArray<CurvePoint> curve = [.. Enumerable.Range(0, 60).Select(Point)];
        var worst = curve.MaxBy(p => p.Penetration)!;
        return new MediaForecast
        {
            Correlations = CorrelationSet.KirschStechkina1978,
            OperatingPoint = new OperatingPoint { FaceVelocity = Speed.FromCentimetersPerSecond(5.3) },
            PressureDrop = Pressure.FromPascals(41.2),
            Curve = curve,
            MostPenetratingSize = worst.Particle,
            PenetrationAtMostPenetratingSize = worst.Penetration,
            QualityFactorPerPascal = -Math.Log(worst.Penetration) / 41.2,
            Caveats = [],
            MostPenetratingSizeModelBand = new LengthInterval(Length.FromMicrometers(0.15), Length.FromMicrometers(0.22)),
            PressureDropModelBandPascals = new Interval(36, 66),
            Uncertainty = new MeasurementUncertainty
            {
                Draws = 2000,
                Seed = 1,
                PressureDropPascals = new Interval(36, 47),
                MostPenetratingSize = new LengthInterval(Length.FromMicrometers(0.16), Length.FromMicrometers(0.19)),
                PenetrationAtMostPenetratingSize = new Interval(0.04, 0.069),
                QualityFactorPerPascal = new Interval(0.06, 0.08),
                Ranking = [Cause("diameter-scale", 0.62, 0.5), Cause("thickness", 0.3, 0.4), Cause("solidity", 0.08, 0.1)],
            },
        };
    }

    private static InputContribution Cause(string input, double penetration, double drop) => new()
    {
        Input = input,
        Layer = 1,
        LogPenetrationDeviation = 0.1 * penetration,
        PressureDropDeviation = 0.05 * drop,
        PenetrationShare = penetration,
        PressureDropShare = drop,
    };

    private static ClassForecast Class() => new()
    {
        Standard = "Invented standard",
        Edition = "made up",
        Provenance = "no source: a test",
        Class = "I2",
        Probability = 0.71,
        All = [new ClassProbability("I1", 0.93, true), new ClassProbability("I2", 0.71, true), new ClassProbability("I3", 0.2, false)],
        NotJudged = "anything else",
    };

    private static VelocityPoint Sweep(int i) => new(
        Speed.FromCentimetersPerSecond(i),
        Pressure.FromPascals(7.7 * i),
        Length.FromMicrometers(0.3 * Math.Pow(i, -0.25)),
        Math.Exp(-4.2 * Math.Pow(i, -0.2)),
        4.2 * Math.Pow(i, -0.2) / (7.7 * i));

    private static GradeVerdict Verdict(DiameterSurvey survey, MediaForecast forecast)
    {
        var grade = new Grade("Invented grade 25", [
            new Limit(Characteristic.MeanDiameter, Length.FromMicrometers(1.2), Length.FromMicrometers(2.2)),
            new Limit(Characteristic.D50, null, Length.FromMicrometers(1.75)),
            new Limit(Characteristic.Solidity, null, Ratio.FromDecimalFractions(0.1)),
            new Limit(Characteristic.PressureDrop, null, Pressure.FromPascals(60)),
            new Limit(Characteristic.AirPermeability, Speed.FromMillimetersPerSecond(300), null) { TestPressure = Pressure.FromPascals(200) },
        ]);
        return grade.Judge(limit => limit.Characteristic.Key switch
        {
            "mean_diameter" => new ObservedValue(survey.LengthWeighted.Mean, survey.Budget.Combined) { DegreesOfFreedom = survey.Budget.EffectiveDegreesOfFreedom, Sampling = new SamplingShare(survey.Budget.Combined, survey.FieldCount) },
            "d50" => new ObservedValue(survey.LengthWeighted.D50, Length.FromMicrometers(0.06)),
            "pressure_drop" => new ObservedValue(forecast.PressureDrop, Pressure.FromPascals(3)) { ModelBand = (Pressure.FromPascals(36), Pressure.FromPascals(66)) },
            "air_permeability" => new ObservedValue(Speed.FromMillimetersPerSecond(258), Speed.FromMillimetersPerSecond(9)),
            _ => null,
        });
    }

    private static Recipe Recipe(IEnumerable<FieldFinding> fields) => new()
    {
        Software = "FiberScope 0.0.0-test",
        MadeAt = new DateTimeOffset(2026, 3, 4, 9, 5, 0, TimeSpan.FromHours(1)),
        SwatchFile = "swatch.yaml",
        FileHashes = ImmutableSortedDictionary<string, string>.Empty.Add("swatch.yaml", new string('b', 64)).Add("grade.yaml", new string('c', 64)),
        Inputs = [new RecipeEntry("face_velocity", "5.3 cm/s", "swatch file, line 12"), new RecipeEntry("basis_weight", "25 gsm", "swatch file, line 7")],
        Settings = [new RecipeEntry("bootstrap seed", "1", "default")],
        Images = [.. fields.Select(f => new ImageRecord(f.Name, f.Measurement.Micrograph.Source.Sha256, Length.FromNanometers(50), "swatch file", "invented@1"))],
    };

    private static double Normal(Random random) =>
        Math.Sqrt(-2 * Math.Log(1 - random.NextDouble())) * Math.Cos(2 * Math.PI * random.NextDouble());
}
