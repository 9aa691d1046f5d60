package benchtrue.cli;

import benchtrue.record.SheetPage;
import benchtrue.record.SummaryText;
import benchtrue.run.Closing;
import benchtrue.run.Control;
import benchtrue.run.Desk;
import benchtrue.screen.Panes;
import benchtrue.sheet.BenchSheet;
import java.io.ByteArrayOutputStream;
import java.io.IOException;
import java.io.PrintStream;
import java.nio.charset.StandardCharsets;
import java.util.concurrent.ConcurrentLinkedQueue;
import java.util.concurrent.ExecutionException;
import java.util.concurrent.FutureTask;

/** A run in panes: it works on a thread of its own, while this one owns the terminal. */
final class PaneRun {
    private static final String GONE = "The terminal went away; the run was closed.";

    private final Desk desk;
    private final BenchSheet sheet;
    private final Output output;
    private final ConcurrentLinkedQueue<String> troubles = new ConcurrentLinkedQueue<>();

    /** The run itself. */
    interface Work {
        /** @param output for what goes wrong meanwhile */
        Closing run(Output output) throws Exception;
    }

    PaneRun(Desk desk, BenchSheet sheet, Output output) {
        this.desk = desk;
        this.sheet = sheet;
        this.output = output;
    }

    /** Returns when the run is over and the terminal is as it was; what went wrong is then printed. */
    Closing show(Work work) throws Exception {
        ByteArrayOutputStream stray = new ByteArrayOutputStream();
        PrintStream out = System.out;
        PrintStream err = System.err;
        PrintStream aside = new PrintStream(stray, true, StandardCharsets.UTF_8);
        System.setOut(aside); // one stray character would spoil the panes
        System.setErr(aside);
        try {
            return shown(work);
        } finally {
            System.setOut(out);
            System.setErr(err);
            troubles.forEach(output::error);
            stray.toString(StandardCharsets.UTF_8).lines().forEach(output::error);
        }
    }

    private Closing shown(Work work) throws Exception {
        Panes panes = open();
        Output aside = output.withErrors(words -> {
            troubles.add(words);
            panes.trouble(words);
        });
        FutureTask<Closing> task = new FutureTask<>(() -> work.run(aside));
        new Thread(task, "run").start();
        try {
            panes.show(task::isDone);
        } catch (IOException e) {
            troubles.add(GONE);
        } finally {
            desk.send(new Control.Close());
            close(panes);
        }
        try {
            return task.get();
        } catch (ExecutionException e) {
            throw e.getCause() instanceof Exception cause ? cause : e;
        }
    }

    private Panes open() throws Refusal {
        try {
            return Panes.open(desk, output.ascii(), SheetPage.of(sheet), SummaryText::brief);
        } catch (IOException e) {
            throw new Refusal("The panes cannot use this terminal (" + e.getMessage() + "); try --plain");
        }
    }

    private void close(Panes panes) {
        try {
            panes.close();
        } catch (IOException e) {
            troubles.add(GONE);
        }
    }
}
