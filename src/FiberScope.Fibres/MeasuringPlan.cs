using FiberScope.Statistics;

namespace FiberScope.Fibres;

/// <summary>How much more measuring a wanted uncertainty costs.</summary>
internal static class MeasuringPlan
{
    private const int MostFields = 1000;

    /// <summary>The smallest number of fields like those measured whose mean has the wanted interval.</summary>
    public static int? FieldsNeeded(DiameterSurvey survey, double relativeHalfWidth)
    {
        if (survey.FieldCount < 2)
        {
            return null;
        }

        double Square(string name) => survey.Budget.Parts.Where(p => p.Name == name).Sum(p => p.StandardUncertainty.Meters * p.StandardUncertainty.Meters);
        var wanted = relativeHalfWidth * survey.LengthWeighted.Mean.Meters;
        var lasting = Square("scale") + Square("edge") + Square("selection");
        var oneField = (Square("fibres") + Square("fields")) * survey.FieldCount;
        for (var fields = 2; fields <= MostFields; fields++)
        {
            var sampling = oneField / fields;
            var freedom = sampling > 0 ? (fields - 1) * Math.Pow((lasting + sampling) / sampling, 2) : double.PositiveInfinity;
            if (ClusteredMean.StudentFactor95(freedom) * Math.Sqrt(lasting + sampling) <= wanted)
            {
                return fields;
            }
        }

        return null;
    }
}
