package benchtrue.run;

import benchtrue.alarm.ReferenceModel;
import benchtrue.estimate.Estimator;
import benchtrue.sheet.ReferenceSpec;
import java.util.Arrays;
import java.util.Locale;
import org.jspecify.annotations.Nullable;

/** When the reference model of one group is adopted: typed, from an earlier run, by itself when all is well, or by hand. */
final class Adoption {
    private final GroupRun group;
    private final ReferenceSpec spec;
    private final Log log;
    private String waitingFor = "";

    /** @param earlier model of an earlier run; null: none */
    Adoption(GroupRun group, ReferenceSpec spec, @Nullable ReferenceModel earlier, Log log) {
        this.group = group;
        this.spec = spec;
        this.log = log;
        ReferenceModel first = earlier == null ? typed() : earlier;
        if (first != null) {
            adopt(first);
        }
    }

    private @Nullable ReferenceModel typed() {
        int relations = group.specs().size();
        return spec.typed().stream()
                .filter(t -> t.group() == group.index())
                .findFirst()
                .map(t -> new ReferenceModel(
                        t.values(),
                        t.covariance(),
                        filled(relations, t.residualStandardDeviation()),
                        filled(relations, t.degreesOfFreedom()),
                        Double.isInfinite(t.degreesOfFreedom()) ? Double.POSITIVE_INFINITY : t.degreesOfFreedom(),
                        Double.NaN,
                        0,
                        0,
                        ReferenceModel.How.TYPED,
                        "",
                        ""))
                .orElse(null);
    }

    private static double[] filled(int size, double value) {
        double[] all = new double[size];
        Arrays.fill(all, value);
        return all;
    }

    /** Adopts the present model where the sheet's time has come and nothing stands against it. */
    void consider(boolean settled, long reading, double time) {
        if (group.monitor().reference() != null || !(time >= spec.afterSeconds())) {
            return;
        }
        waitingFor = group.monitor().notAdoptedWhy(settled, group.estimates());
        if (waitingFor.isEmpty()) {
            adopt(model(reading, time, ReferenceModel.How.AUTOMATIC, "", ""));
        }
    }

    /** Why none is adopted yet though its time has come; empty where there is one or it is too early. */
    String waitingFor() {
        return group.monitor().reference() == null ? waitingFor : "";
    }

    /** @return why it cannot be adopted; empty where it was */
    String byHand(long reading, double time, String name, String reason) {
        if (!group.estimator().determined()) {
            return "an unknown is not determined";
        }
        if (!(group.estimator().residualSd(0) > 0)) {
            return "the noise is not known yet";
        }
        adopt(model(reading, time, ReferenceModel.How.BY_HAND, name, reason));
        return "";
    }

    /** The present live model. */
    ReferenceModel model(long reading, double time, ReferenceModel.How how, String name, String reason) {
        Estimator estimator = group.estimator();
        int relations = group.specs().size();
        double[] sd = new double[relations];
        double[] nu = new double[relations];
        for (int k = 0; k < relations; k++) {
            sd[k] = estimator.residualSd(k);
            nu[k] = estimator.degreesOfFreedom(k);
        }
        Estimates now = group.now();
        return new ReferenceModel(
                now.values(),
                now.covariance(),
                sd,
                nu,
                estimator.effectiveReadings(),
                Double.NaN,
                reading,
                time,
                how,
                name,
                reason);
    }

    private void adopt(ReferenceModel model) {
        group.monitor().adopt(model);
        StringBuilder text =
                new StringBuilder("reference model adopted " + model.how().words());
        if (!model.by().isEmpty()) {
            text.append(" by ").append(model.by());
        }
        if (!model.reason().isEmpty()) {
            text.append(": ").append(model.reason());
        }
        int p = model.values().length;
        for (int i = 0; i < p; i++) {
            text.append(String.format(
                    Locale.ROOT,
                    "; %s = %.9g, u %.3g %s",
                    group.group().unknowns().get(i).name(),
                    model.values()[i],
                    Math.sqrt(model.covariance()[i * p + i]),
                    group.group().unknowns().get(i).unit().symbol()));
        }
        if (model.widens()) {
            text.append(String.format(
                    Locale.ROOT,
                    "; it rests on %.0f effective readings only, so limits against it are wider",
                    model.effectiveReadings()));
        }
        log.event("adopted", group.specs().get(0).label(), Double.NaN, "", text.toString());
    }
}
