package benchtrue.run;

import benchtrue.alarm.AlarmBook;
import benchtrue.model.Forgetting;
import java.util.ArrayList;
import java.util.List;

/** Does what the operator asks, and logs what came of it. */
final class Acts {
    private final Engine engine;
    private final Log log;
    private final List<String> marks = new ArrayList<>();
    private final List<String> setUp = new ArrayList<>();
    private boolean onHold;

    Acts(Engine engine, Log log) {
        this.engine = engine;
        this.log = log;
    }

    void apply(Act act) {
        AlarmBook book = engine.monitor().book();
        if (act instanceof Act.Acknowledge acknowledge) {
            refuseUnless(
                    book.acknowledge(acknowledge.alarm(), acknowledge.comment()),
                    "no alarm " + acknowledge.alarm() + " waits to be acknowledged");
        } else if (act instanceof Act.Shelve shelve) {
            refuseUnless(
                    book.shelve(shelve.alarm(), shelve.seconds(), shelve.reason()),
                    "no alarm " + shelve.alarm() + " stands that could be shelved");
        } else if (act instanceof Act.Mark mark) {
            marks.add(ClockText.of(engine.time()) + "  " + mark.note());
            log.event("mark", mark.note());
        } else if (act instanceof Act.ChangeMemory change) {
            forget(change);
        } else if (act instanceof Act.Hold) {
            onHold = true;
            log.event("hold", "estimates held by the operator: readings are tested but not used");
        } else if (act instanceof Act.Release) {
            onHold = false;
            log.event("release", "estimates released by the operator");
        } else if (act instanceof Act.Adopt adopt) {
            adopt(adopt);
        } else if (act instanceof Act.NewSegment segment) {
            engine.beginSegment(segment.reason());
        } else if (act instanceof Act.SetUp step) {
            String text = step.step() + (step.skipped() ? " skipped: " : ": ") + step.text();
            setUp.add(text);
            log.event("set-up", text);
        }
    }

    private void refuseUnless(boolean done, String why) {
        if (!done) {
            log.event("refused", why);
        }
    }

    private void forget(Act.ChangeMemory change) {
        for (GroupRun group : engine.groups()) {
            group.forget(engine.reading() + 1, new Forgetting(group.forgetting().kind(), change.memory()));
        }
        log.event("memory", "memory changed to " + MemoryWords.of(change.memory()));
    }

    private void adopt(Act.Adopt adopt) {
        for (GroupRun group : engine.groups()) {
            String why = engine.adoption(group.index())
                    .byHand(engine.reading(), engine.time(), adopt.name(), adopt.reason());
            refuseUnless(why.isEmpty(), "the present model cannot become the reference: " + why);
        }
    }

    boolean onHold() {
        return onHold;
    }

    List<String> marks() {
        return List.copyOf(marks);
    }

    List<String> setUp() {
        return List.copyOf(setUp);
    }
}
