package benchtrue.record;

import benchtrue.alarm.Alarm;
import benchtrue.model.Forgetting;
import benchtrue.model.Memory;
import benchtrue.run.Closing;
import java.io.IOException;
import java.util.List;

/** summary.json: the closing summary for programs. Fields are added to it, never changed or taken away. */
public final class SummaryJson {
    static final String NAME = "summary.json";

    private final JsonOut out;

    private SummaryJson(JsonOut out) {
        this.out = out;
    }

    public static String of(Closing closing) {
        return JsonOut.text(out -> new SummaryJson(out).closing(closing));
    }

    /** Several runs as an array, in their order. */
    public static String of(List<Closing> closings) {
        return JsonOut.text(out -> out.array(closings, new SummaryJson(out)::closing));
    }

    private void closing(Closing closing) throws IOException {
        out.object(o -> {
            out.object("program", p -> {
                out.text("name", Program.NAME);
                out.text("version", Program.version());
            });
            out.object("sheet", s -> {
                out.text("title", closing.sheetTitle());
                out.text("item", closing.item());
                out.text("sha256", closing.sheetSha256());
            });
            out.object("source", s -> source(closing));
            out.object("readings", r -> readings(closing));
            out.array("relations", closing.relations(), this::relation);
            out.array("results", closing.results(), this::result);
            out.array("alarms", closing.alarms(), this::alarm);
            out.array("instruments", closing.instruments(), this::instrument);
            out.array("marks", closing.marks(), out::string);
            out.array("careful", closing.careful(), out::string);
            out.whole("status", closing.status());
            out.text("statusText", closing.statusText());
        });
    }

    private void source(Closing closing) throws IOException {
        out.text("kind", closing.sourceKind());
        out.text("name", closing.sourceName());
        out.text("sha256", closing.sourceSha256());
        out.text(
                "startedUtc",
                closing.startedUtc() == null ? null : closing.startedUtc().toString());
    }

    private void readings(Closing closing) throws IOException {
        Closing.Readings readings = closing.readings();
        out.whole("seen", readings.seen());
        out.whole("used", readings.used());
        out.whole("heldOut", readings.heldOut());
        out.whole("excluded", readings.excluded());
        out.whole("malformed", readings.malformed());
        out.whole("missing", readings.missing());
        out.whole("gaps", readings.gaps());
        out.number("first", readings.first());
        out.number("last", readings.last());
        out.number("seconds", readings.seconds());
        out.array(
                "leftOut",
                closing.held(),
                held -> out.object(h -> {
                    out.text("reason", held.reason());
                    out.whole("count", held.count());
                }));
    }

    private void relation(Closing.Relation relation) throws IOException {
        out.object(o -> {
            out.text("equation", relation.equation());
            out.text("response", relation.response());
            out.text("unit", relation.unit());
            out.object("forgetting", f -> forgetting(relation));
            out.array("unknowns", relation.unknowns(), this::unknown);
            out.number("residualStandardDeviation", relation.residualStandardDeviation());
            out.number("degreesOfFreedom", relation.degreesOfFreedom());
            out.number("conditionIndex", relation.conditionIndex());
            out.array("inseparable", relation.inseparable(), names -> out.array(names, out::string));
            out.number("autocorrelation", relation.autocorrelation());
            out.number("durbinWatson", relation.durbinWatson());
            out.number("effectiveReadings", relation.effectiveReadings());
            batch(relation);
            constancy(relation);
            out.array("residualTests", relation.residualTests(), out::string);
            out.array("segments", relation.segments(), this::segment);
        });
    }

    private void forgetting(Closing.Relation relation) throws IOException {
        Forgetting forgetting = relation.forgetting();
        out.text("kind", forgetting.kind() == Forgetting.Kind.DIRECTIONAL ? "directional" : "exponential");
        out.number("factor", factor(forgetting.memory()));
        out.text("memory", relation.memory());
        out.whole("floorRows", relation.floorRows());
    }

    /** Of one reading; NaN where forgetting goes by time. */
    private static double factor(Memory memory) {
        return memory instanceof Memory.Seconds ? Double.NaN : memory.factor(0, true);
    }

    private void unknown(Closing.Unknown unknown) throws IOException {
        out.object(o -> {
            out.text("name", unknown.name());
            out.text("unit", unknown.unit());
            out.number("estimate", unknown.estimate());
            out.number("standardUncertainty", unknown.standardUncertainty());
            out.number("expandedUncertainty", unknown.expandedUncertainty());
            out.number("coverageFactor", unknown.coverageFactor());
            out.number("degreesOfFreedom", unknown.degreesOfFreedom());
            out.truth("determined", unknown.determined());
            out.truth("settled", unknown.settled());
            out.number("wanted", unknown.wanted());
            out.interval("limits", unknown.limits());
            out.text("rule", unknown.rule());
            out.text("verdict", unknown.verdict());
            out.text("verdictWithheld", unknown.verdictWithheld());
            out.number("conformityProbability", unknown.conformityProbability());
            out.array("budget", unknown.budget(), this::contribution);
        });
    }

    private void contribution(Closing.Contribution contribution) throws IOException {
        out.object(o -> {
            out.text("name", contribution.name());
            out.number("standardUncertainty", contribution.standardUncertainty());
            out.number("degreesOfFreedom", contribution.degreesOfFreedom());
        });
    }

    private void batch(Closing.Relation relation) throws IOException {
        Closing.Batch batch = relation.batch();
        if (batch == null) {
            out.nothing("batch");
            return;
        }
        out.object("batch", b -> {
            out.array(
                    "unknowns",
                    batch.unknowns(),
                    fitted -> out.object(f -> {
                        out.text("name", fitted.name());
                        out.number("estimate", fitted.estimate());
                        out.number("standardUncertainty", fitted.standardUncertainty());
                        out.number("differenceInU", fitted.differenceInU());
                    }));
            out.number("largestDifferenceInU", batch.largestDifferenceInU());
            out.truth("agrees", batch.agrees());
            out.text("judgement", batch.judgement());
        });
    }

    private void constancy(Closing.Relation relation) throws IOException {
        Closing.Constancy constancy = relation.constancy();
        if (constancy == null) {
            out.nothing("constancy");
            return;
        }
        out.object("constancy", c -> {
            out.number("statistic", constancy.statistic());
            out.number("degreesOfFreedom", constancy.degreesOfFreedom());
            out.number("pValue", constancy.pValue());
        });
    }

    private void segment(Closing.Segment segment) throws IOException {
        out.object(o -> {
            out.number("from", segment.from());
            out.number("to", segment.to());
            out.text("reason", segment.reason());
            out.array("unknowns", segment.unknowns(), this::unknown);
        });
    }

    private void result(Closing.Result result) throws IOException {
        out.object(o -> {
            out.text("name", result.name());
            out.text("unit", result.unit());
            out.number("value", result.value());
            out.number("standardUncertainty", result.standardUncertainty());
            out.number("expandedUncertainty", result.expandedUncertainty());
            out.number("coverageFactor", result.coverageFactor());
            out.number("degreesOfFreedom", result.degreesOfFreedom());
            out.interval("limits", result.limits());
            out.text("rule", result.rule());
            out.text("verdict", result.verdict());
            out.text("verdictWithheld", result.verdictWithheld());
            out.number("conformityProbability", result.conformityProbability());
        });
    }

    private void alarm(Alarm alarm) throws IOException {
        out.object(o -> {
            out.whole("id", alarm.id());
            out.text("kind", alarm.kind().word());
            out.text("relation", alarm.relation());
            out.text("channel", alarm.channel());
            out.text("unknown", alarm.unknown());
            out.number("onset", alarm.onset());
            out.number("onsetFrom", alarm.onsetFrom());
            out.number("onsetTo", alarm.onsetTo());
            onsetReading(alarm);
            out.number("raised", alarm.raised());
            out.whole("raisedReading", alarm.raisedReading());
            out.number("size", alarm.size());
            out.number("sizeU", alarm.sizeU());
            out.text("unit", alarm.unit());
            out.text("cause", alarm.cause());
            out.truth("provisional", alarm.provisional());
            out.text("state", alarm.state().word());
            out.whole("count", alarm.count());
            out.text("priority", alarm.priority().word());
            out.text("text", alarm.text());
            out.text("comment", alarm.comment());
        });
    }

    private void onsetReading(Alarm alarm) throws IOException {
        if (alarm.onsetReading() == 0) {
            out.nothing("onsetReading");
        } else {
            out.whole("onsetReading", alarm.onsetReading());
        }
    }

    private void instrument(Closing.Instrument instrument) throws IOException {
        out.object(o -> {
            out.text("channel", instrument.channel());
            out.text("unit", instrument.unit());
            out.text("due", instrument.due());
            out.text("dueNote", instrument.dueNote());
            out.text("correction", instrument.correction());
        });
    }
}
