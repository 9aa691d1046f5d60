package benchtrue.estimate;

import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import java.util.SplittableRandom;
import java.util.concurrent.TimeUnit;
import org.ejml.data.DMatrixRMaj;
import org.ejml.dense.row.factory.LinearSolverFactory_DDRM;
import org.ejml.interfaces.linsol.LinearSolverDense;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OperationsPerInvocation;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** One reading with its estimates, beside updating regressions of general libraries on the same rows. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.NANOSECONDS)
@OperationsPerInvocation(UpdateBench.ROWS)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(1)
public class UpdateBench {
    static final int ROWS = 2048;

    @Param({"3", "8"})
    int unknowns;

    private double[][] rows;
    private double[] responses;
    private double[] estimates;
    private double[] covariance;
    private boolean[] constant;

    @Setup
    public void makeRows() {
        SplittableRandom random = new SplittableRandom(1);
        rows = new double[ROWS][unknowns];
        responses = new double[ROWS];
        for (int i = 0; i < ROWS; i++) {
            for (int j = 0; j < unknowns; j++) {
                rows[i][j] = j == unknowns - 1 ? 1 : random.nextGaussian();
                responses[i] += (j + 1) * rows[i][j];
            }
            responses[i] += 0.01 * random.nextGaussian();
        }
        estimates = new double[unknowns];
        covariance = new double[unknowns * unknowns];
        constant = new boolean[unknowns];
        constant[unknowns - 1] = true;
    }

    private double run(Memory memory, boolean withCovariance) {
        Estimator estimator = new Estimator(constant, 1, new Forgetting(Forgetting.Kind.EXPONENTIAL, memory));
        double sum = 0;
        for (int i = 0; i < ROWS; i++) {
            estimator.next(1);
            estimator.predict(0, rows[i], responses[i], 1);
            sum += estimator.standardized();
            estimator.use();
            estimator.estimates(estimates);
            if (withCovariance) {
                estimator.covariance(covariance);
            }
        }
        return sum + estimates[0];
    }

    @Benchmark
    public double update() {
        return run(new Memory.All(), false);
    }

    @Benchmark
    public double updateForgetting() {
        return run(new Memory.Readings(600), false);
    }

    @Benchmark
    public double updateForgettingWithCovariance() {
        return run(new Memory.Readings(600), true);
    }

    @Benchmark
    public double commonsMath() {
        org.apache.commons.math3.stat.regression.MillerUpdatingRegression regression =
                new org.apache.commons.math3.stat.regression.MillerUpdatingRegression(unknowns, false);
        double sum = 0;
        for (int i = 0; i < ROWS; i++) {
            regression.addObservation(rows[i], responses[i]);
            if (i > unknowns) {
                sum += regression.regress().getParameterEstimate(0);
            }
        }
        return sum;
    }

    @Benchmark
    public double hipparchus() {
        org.hipparchus.stat.regression.MillerUpdatingRegression regression =
                new org.hipparchus.stat.regression.MillerUpdatingRegression(unknowns, false);
        double sum = 0;
        for (int i = 0; i < ROWS; i++) {
            regression.addObservation(rows[i], responses[i]);
            if (i > unknowns) {
                sum += regression.regress().getParameterEstimate(0);
            }
        }
        return sum;
    }

    /** A single fit of all rows: what a batch costs a row. */
    @Benchmark
    public double ejmlBatch() {
        DMatrixRMaj a = new DMatrixRMaj(rows);
        DMatrixRMaj b = DMatrixRMaj.wrap(ROWS, 1, responses.clone());
        DMatrixRMaj x = new DMatrixRMaj(unknowns, 1);
        LinearSolverDense<DMatrixRMaj> solver = LinearSolverFactory_DDRM.leastSquares(ROWS, unknowns);
        solver.setA(a);
        solver.solve(b, x);
        return x.get(0);
    }
}
