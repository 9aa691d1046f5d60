package benchtrue.estimate;

/**
 * The noise of one relation from its recursive residuals r = e/√(1/w + φᵀCφ) (Brown, Durbin and Evans 1975):
 * s² = Σf·r²/Σf and ν = (Σf)²/Σf². Without forgetting that is RSS/(n − p) with ν = n − p exactly.
 */
final class Noise {
    private double sum;
    private double weights;
    private double squaredWeights;

    void clear() {
        sum = 0;
        weights = 0;
        squaredWeights = 0;
    }

    void age(double factor) {
        sum *= factor;
        weights *= factor;
        squaredWeights *= factor * factor;
    }

    /** @param squaredResidual r², in squared units of the response */
    void add(double squaredResidual) {
        sum += squaredResidual;
        weights += 1;
        squaredWeights += 1;
    }

    /** Of a reading of weight 1; NaN while nothing is known. */
    double variance() {
        return weights > 0 ? sum / weights : Double.NaN;
    }

    double degreesOfFreedom() {
        return squaredWeights > 0 ? weights * weights / squaredWeights : 0;
    }
}
