package benchtrue.run;

/** One relation at one reading: y = φᵀθ, over the unknowns of its whole group. Filled again for each reading. */
final class Row {
    /** One for each unknown of the group; 0 where the relation does not have it. */
    final double[] phi;

    double response = Double.NaN;
    double weight = 1;

    /** False where something is missing: then the numbers mean nothing. */
    boolean present;

    Row(int unknowns) {
        phi = new double[unknowns];
    }

    void copy(Row other) {
        System.arraycopy(other.phi, 0, phi, 0, phi.length);
        response = other.response;
        weight = other.weight;
        present = other.present;
    }

    /** y − φᵀθ. */
    double residual(double[] estimates) {
        double residual = response;
        for (int i = 0; i < phi.length; i++) {
            // An unknown that this relation does not have may be undetermined.
            if (phi[i] != 0) {
                residual -= phi[i] * estimates[i];
            }
        }
        return residual;
    }
}
