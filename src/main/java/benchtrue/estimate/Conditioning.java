package benchtrue.estimate;

import java.util.ArrayList;
import java.util.Arrays;
import java.util.Collections;
import java.util.List;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.DecompositionFactory_DDRM;
import org.ejml.interfaces.decomposition.SingularValueDecomposition_F64;

/** Condition index and variance-decomposition proportions of an information factor. */
final class Conditioning {
    private static final double LARGEST = 1e12;
    private static final double HIGH = 30;
    private static final double MAJOR = 0.5;
    private static final double COMPETING = 10;
    /** Correlation of errors from which two unknowns belong to one dependency. */
    private static final double TOGETHER = 0.1;

    /** Part of an unknown's unit vector in the unknown directions above which it is not determined. */
    private static final double TOUCHED = 1e-6;

    private final int p;
    private final double[] scale;
    private final double[] singular;
    private final DMatrixRMaj v;
    private final Integer[] order;

    private Conditioning(InformationFactor factor) {
        p = factor.size();
        scale = new double[p];
        DMatrixRMaj scaled = new DMatrixRMaj(p, p);
        for (int j = 0; j < p; j++) {
            scale[j] = Math.sqrt(factor.normSquared(j));
            for (int i = 0; i <= j; i++) {
                double entry = Math.sqrt(factor.d(i)) * factor.r(i, j);
                scaled.set(i, j, scale[j] > 0 ? entry / scale[j] : 0);
            }
        }
        SingularValueDecomposition_F64<DMatrixRMaj> svd = DecompositionFactory_DDRM.svd(p, p, false, true, true);
        if (!svd.decompose(scaled)) {
            throw new IllegalStateException("singular values of a " + p + "×" + p + " matrix did not converge");
        }
        singular = svd.getSingularValues();
        v = svd.getV(null, false);
        order = new Integer[p];
        for (int j = 0; j < p; j++) {
            order[j] = j;
        }
        Arrays.sort(order, (a, b) -> Double.compare(singular[b], singular[a]));
    }

    static Diagnosis of(InformationFactor factor) {
        return new Conditioning(factor).diagnosis();
    }

    private Diagnosis diagnosis() {
        double largest = singular[order[0]];
        double smallest = singular[order[p - 1]];
        boolean[] determined = new boolean[p];
        for (int k = 0; k < p; k++) {
            determined[k] = determined(k, largest);
        }
        boolean[] weak = new boolean[p];
        List<List<Integer>> inseparable = new ArrayList<>();
        for (int place = p - 1; place > 0 && singular[order[place]] * HIGH < largest; ) {
            int first = place;
            // Singular values of one order of magnitude share out their dependencies arbitrarily: taken together.
            while (first > 1
                    && singular[order[first - 1]] * HIGH < largest
                    && singular[order[first - 1]] < COMPETING * bounded(order[place], largest)) {
                first--;
            }
            for (List<Integer> group : groups(first, place, largest)) {
                group.forEach(k -> weak[k] = true);
                if (group.size() > 1) {
                    inseparable.add(group);
                }
            }
            place = first - 1;
        }
        double[] weakest = new double[p];
        for (int k = 0; k < p; k++) {
            weakest[k] = scale[k] > 0 ? v.get(k, order[p - 1]) * scale[k] : v.get(k, order[p - 1]);
        }
        double index = smallest * LARGEST > largest ? largest / smallest : Double.POSITIVE_INFINITY;
        return new Diagnosis(index, determined, weak, List.copyOf(inseparable), weakest);
    }

    private boolean determined(int k, double largest) {
        if (!(largest > 0)) {
            return false;
        }
        double touched = 0;
        for (int j = 0; j < p; j++) {
            if (!(singular[j] * LARGEST > largest)) {
                touched += v.get(k, j) * v.get(k, j);
            }
        }
        return touched < TOUCHED * TOUCHED;
    }

    /**
     * Unknowns of whose variance more than half comes from the singular values at these places, together where their errors go
     * together.
     */
    private List<List<Integer>> groups(int first, int last, double largest) {
        List<Integer> left = new ArrayList<>();
        for (int k = 0; k < p; k++) {
            if (covariance(k, k, first, last, largest) > MAJOR * covariance(k, k, 0, p - 1, largest)) {
                left.add(k);
            }
        }
        List<List<Integer>> groups = new ArrayList<>();
        while (!left.isEmpty()) {
            List<Integer> group = new ArrayList<>(List.of(left.remove(0)));
            for (int i = 0; i < group.size(); i++) {
                for (int k : List.copyOf(left)) {
                    if (together(group.get(i), k, first, last, largest)) {
                        left.remove((Integer) k);
                        group.add(k);
                    }
                }
            }
            Collections.sort(group);
            groups.add(group);
        }
        return groups;
    }

    private boolean together(int k, int l, int first, int last, double largest) {
        double own = covariance(k, k, first, last, largest) * covariance(l, l, first, last, largest);
        return Math.abs(covariance(k, l, first, last, largest)) > TOGETHER * Math.sqrt(own);
    }

    /** Of two scaled unknowns, from the singular values at these places. */
    private double covariance(int k, int l, int first, int last, double largest) {
        double sum = 0;
        for (int place = first; place <= last; place++) {
            int j = order[place];
            sum += v.get(k, j) / bounded(j, largest) * (v.get(l, j) / bounded(j, largest));
        }
        return sum;
    }

    private double bounded(int j, double largest) {
        return Math.max(singular[j], largest / (LARGEST * LARGEST));
    }
}
