package benchtrue.run;

import benchtrue.estimate.Estimator;
import benchtrue.estimate.Forecast;
import benchtrue.estimate.Prospect;

/** How the uncertainty of one group's unknowns will go on, from what is known now. */
final class Outlook {
    private final GroupRun run;
    private final Estimates now;
    private final double interval;

    /** @param interval median time between readings, in s; NaN: not known */
    Outlook(GroupRun run, Estimates now, double interval) {
        this.run = run;
        this.now = now;
        this.interval = interval;
    }

    /** Of one unknown; all must be determined. */
    Prospect prospect(int unknown) {
        Estimator estimator = run.estimator();
        int p = now.size();
        double[] inverse = new double[p * p];
        estimator.unscaledCovariance(inverse);
        double other = now.other()[unknown] * now.other()[unknown];
        for (double[] effect : now.systematic()) {
            other += effect[unknown] * effect[unknown];
        }
        double[] c = new double[p];
        c[unknown] = 1;
        double s = estimator.residualSd(0);
        return Prospect.of(
                inverse,
                Math.sqrt(now.covariance()[unknown * p + unknown]),
                s * s * widening(unknown),
                run.forgetting().memory().factor(Double.isNaN(interval) ? 0 : interval, true),
                now.degreesOfFreedom(),
                Math.sqrt(other),
                c);
    }

    /** (1 + ρ)/(1 − ρ) for a positive autocorrelation of the unknown's score, else 1. */
    double widening(int unknown) {
        double rho = run.estimator().autocorrelation(unknown);
        return rho > 0 ? (1 + rho) / (1 - rho) : 1;
    }

    /** When U comes down to the wanted one if the rig goes on as in the last readings; NaN where that cannot be said. */
    Forecast forecast(int unknown, double wanted) {
        boolean known = now.covariance()[unknown * now.size() + unknown] > 0;
        if (Double.isNaN(wanted) || !run.estimator().determined() || !known) {
            return new Forecast(Double.NaN, Double.NaN, "");
        }
        return Forecast.of(prospect(unknown), wanted, recentInformation(), interval);
    }

    /** Mean of Σwφφᵀ of one reading over the last ones, p×p. */
    private double[] recentInformation() {
        int p = now.size();
        double[] m = new double[p * p];
        RowRing ring = run.ring();
        for (int r = 0; r < ring.size(); r++) {
            for (int k = 0; k < run.specs().size(); k++) {
                Row row = ring.row(r, k);
                if (row.present && ring.held(r, k) == null) {
                    double weight = row.weight * run.estimator().relationWeight(k) / ring.size();
                    for (int i = 0; i < p * p; i++) {
                        m[i] += weight * row.phi[i / p] * row.phi[i % p];
                    }
                }
            }
        }
        return m;
    }
}
