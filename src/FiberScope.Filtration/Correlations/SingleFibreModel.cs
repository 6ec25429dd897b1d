namespace FiberScope.Filtration.Correlations;

/// <summary>One correlation set, whole: efficiency, drag, (1 − α) convention and range.</summary>
internal abstract class SingleFibreModel
{
    /// <summary>The published sets whose spread is the model band.</summary>
    public static IReadOnlyList<CorrelationSet> Published { get; } =
        [CorrelationSet.KirschStechkina1978, CorrelationSet.LeeLiu1982, CorrelationSet.Hinds1999];

    public abstract CorrelationSet Set { get; }

    /// <summary>Where the set was fitted.</summary>
    public abstract ApplicableRange Range { get; }

    /// <summary>
    /// Whether −ln P carries a further 1 / (1 − α): coefficients that were fitted with the speed between the fibres belong with it, and only they.
    /// </summary>
    public abstract bool CountsOpenVolumeOnly { get; }

    /// <summary>f = Δp df² / (μ U t) for a mat as uneven as the set takes real mats to be.</summary>
    /// <param name="solidity">α.</param>
    /// <param name="fibreKnudsen">Kn = 2 λ / df.</param>
    /// <param name="unevenness">Further division of the drag: 1 for a mat like those the set stands for.</param>
    public abstract double DragFactor(double solidity, double fibreKnudsen, double unevenness);

    /// <summary>A fibre of this set.</summary>
    /// <param name="solidity">α.</param>
    /// <param name="fibreKnudsen">Kn = 2 λ / df.</param>
    /// <param name="unevenness">Divides all that is not inertial, as it divides the drag.</param>
    public abstract SingleFibre Fibre(double solidity, double fibreKnudsen, double unevenness);

    /// <summary>The model of a set.</summary>
    public static SingleFibreModel Of(CorrelationSet set) => set switch
    {
        CorrelationSet.KirschStechkina1978 => new KirschStechkinaModel(),
        CorrelationSet.LeeLiu1982 => new LeeLiuModel(),
        CorrelationSet.Hinds1999 => new HindsModel(),
        CorrelationSet.Cell => new CellModel(realMat: false),
        CorrelationSet.CellMat => new CellModel(realMat: true),
        _ => throw new ArgumentOutOfRangeException(nameof(set), set, "There is no model for this set of correlations."),
    };
}
