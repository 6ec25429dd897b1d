namespace FiberScope.Imaging.Fitness;

/// <summary>Decides whether a field can be measured, and says what to do at the microscope when it cannot.</summary>
public static class FitnessMeter
{
    /// <summary>Checks a field.</summary>
    /// <param name="micrograph">The picture.</param>
    /// <param name="evidence">What the measurement found, when it was made.</param>
    /// <param name="settings">The limits.</param>
    public static FieldFitness Check(Micrograph micrograph, FieldEvidence evidence, FitnessSettings settings)
    {
        ArgumentNullException.ThrowIfNull(micrograph);
        var sharpness = Sharpness.Of(micrograph);
        var lines = micrograph.Mode == ImagingMode.SecondaryElectron ? LineUnrest.Of(micrograph) : new LineUnrest(0, 0);
        var blurLimit = Math.Max(settings.WidestBlurPixels, settings.BlurShareOfDiameter * (evidence.MedianDiameter ?? 0));
        var checks = new List<FitnessCheck>
        {
            AtMost("focus", sharpness.BlurPixels, blurLimit, "blur of the sharpest edges, sigma in pixels", "Refocus and correct the astigmatism, then take the field again."),
            AtLeast("noise", sharpness.ContrastToNoise, settings.LeastContrastToNoise, "contrast of the strongest edges over the noise of a pixel", "Scan more slowly, average more frames or raise the beam current."),
            AtMost("saturation", Saturation.FlatShare(micrograph), settings.LargestSaturatedShare, "share of the field in flat saturated patches", "Lower contrast or brightness until no fibre is plain white."),
        };
        if (micrograph.Mode == ImagingMode.SecondaryElectron)
        {
            checks.Add(AtMost("charging", lines.Steps, settings.StrongestCharging, "unrest from line to line over the picture's standard deviation", "Lower the accelerating voltage, coat the swatch or scan faster with frame averaging."));
            checks.Add(AtMost("drift", lines.JitterPixels, settings.WidestJitterPixels, "sideways jitter from line to line, standard deviation in pixels", "Let the stage settle, fix the swatch with conductive tape and shield the microscope from vibration."));
        }

        if (evidence.MedianDiameter is { } median)
        {
            checks.Add(AtLeast("resolution", median, settings.LeastDiameterPixels, "median fibre diameter in pixels", "Raise the magnification until the fibres are at least 6 pixels wide."));
        }

        checks.Add(AtLeast("usable-share", UsableShare(micrograph, evidence), settings.LeastUsableShare, "share of the picture that shows measurable mat", "Move to a place with less film, shot and debris, or save the picture without its overlays."));
        return new FieldFitness([.. checks]);
    }

    private static double UsableShare(Micrograph micrograph, FieldEvidence evidence)
    {
        var field = (double)micrograph.Width * micrograph.UsableHeight;
        var defects = Math.Min(field, evidence.Defects.Sum(defect => defect.AreaPixels));
        return (field - defects) / ((double)micrograph.Width * micrograph.Height);
    }

    private static FitnessCheck AtMost(string name, double value, double limit, string meaning, string advice) => new(name, value, limit, value <= limit, meaning, advice);

    private static FitnessCheck AtLeast(string name, double value, double limit, string meaning, string advice) => new(name, value, limit, value >= limit, meaning, advice);
}
