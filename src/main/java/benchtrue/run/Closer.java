package benchtrue.run;

import benchtrue.alarm.Alarm;
import benchtrue.model.DecisionRule;
import benchtrue.sheet.BenchSheet;
import benchtrue.sheet.Channel;
import java.time.LocalDate;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import org.jspecify.annotations.Nullable;

/** Makes the closing summary of a run as it stands: the record is read again for the batch fits and the tests of residuals. */
final class Closer {
    private final Engine engine;
    private final SourceMaker record;
    private final boolean lost;
    private final BenchSheet sheet;

    /** @param lost whether the source was lost before its end */
    Closer(Engine engine, SourceMaker record, boolean lost) {
        this.engine = engine;
        this.record = record;
        this.lost = lost;
        sheet = engine.setup().sheet();
    }

    Closing close() {
        for (GroupRun group : engine.groups()) {
            engine.settling(group.index())
                    .evaluate(
                            engine.reading(),
                            engine.time(),
                            engine.monitor().book().anyStanding());
        }
        List<GroupClosing> groups = analysed();
        List<Closing.Relation> relations = new ArrayList<>();
        groups.forEach(group -> group.addTo(relations));
        List<Closing.Result> results = new ArrayList<>();
        sheet.results().forEach(r -> results.add(groups.get(r.group()).result(r)));
        List<Alarm> alarms = engine.monitor().book().alarms();
        Outcome outcome = Outcome.of(relations, results, alarms, lost);
        Setup setup = engine.setup();
        return new Closing(
                sheet.title(),
                sheet.item(),
                sheet.sha256(),
                sheet.cautions(),
                instruments(),
                setup.sourceKind(),
                setup.sourceName(),
                setup.sourceSha256(),
                engine.startedUtc(),
                engine.tally().closing(engine.monitor().gaps()),
                engine.tally().reasons(),
                relations,
                results,
                alarms,
                engine.acts().marks(),
                careful(groups),
                outcome.status(),
                outcome.text());
    }

    private List<GroupClosing> analysed() {
        SecondPass pass = new SecondPass(engine, record);
        Systematic systematic = new Systematic(sheet);
        Systematic noise = engine.noise().again(sheet);
        List<BatchSink> batches = engine.groups().stream().map(BatchSink::new).toList();
        pass.run(batches);
        List<ResidualSink> residuals = batches.stream()
                .map(b -> new ResidualSink(b, systematic, noise))
                .toList();
        pass.run(residuals, systematic, noise);
        List<ResidualSink.Correction> corrections =
                residuals.stream().map(ResidualSink::correction).toList();
        boolean correct = residuals.stream().anyMatch(ResidualSink::autocorrelated);
        if (correct) {
            pass.run(corrections);
        }
        List<GroupClosing> groups = new ArrayList<>();
        for (int g = 0; g < batches.size(); g++) {
            ResidualSink residual = residuals.get(g);
            groups.add(new GroupClosing(
                    engine,
                    batches.get(g),
                    residual,
                    residual.autocorrelated() ? corrections.get(g).covariance() : null));
        }
        return groups;
    }

    private List<Closing.Instrument> instruments() {
        List<Closing.Instrument> instruments = new ArrayList<>();
        for (Channel channel : sheet.channels()) {
            instruments.add(new Closing.Instrument(
                    channel.name(),
                    channel.unit().symbol(),
                    channel.due() == null ? null : channel.due().toString(),
                    dueNote(channel.due()),
                    channel.correction() == null ? null : channel.correction().text()));
        }
        return instruments;
    }

    private String dueNote(@Nullable LocalDate due) {
        if (due == null) {
            return "";
        }
        if (engine.startedUtc() == null) {
            return "start not recorded: check";
        }
        LocalDate start = engine.startedUtc().atZone(ZoneOffset.UTC).toLocalDate();
        return start.isAfter(due) ? "OVERDUE at the recorded start" : "";
    }

    private List<String> careful(List<GroupClosing> groups) {
        List<String> careful = new ArrayList<>();
        if (lost) {
            careful.add("The source was lost before its end: what came after is not in these numbers.");
        }
        if (engine.exclusions().stream().anyMatch(e -> e.dated())) {
            careful.add(
                    "The sheet dates an exclusion, but the record does not say when it began: nothing was excluded by it.");
        }
        instruments().stream()
                .filter(i -> i.dueNote().startsWith("OVERDUE"))
                .forEach(
                        i -> careful.add("The instrument of channel " + i.channel() + " was overdue for calibration."));
        DecisionRule rule = sheet.rule();
        boolean limits = sheet.results().stream().anyMatch(r -> r.limits() != null)
                || sheet.groups().stream().flatMap(g -> g.unknowns().stream()).anyMatch(u -> u.limits() != null);
        if (rule == null && limits) {
            careful.add(
                    "No decision rule was chosen beforehand ([verdict] rule), so no verdict is given on the limits.");
        }
        groups.forEach(group -> careful.addAll(group.careful()));
        return careful;
    }
}
