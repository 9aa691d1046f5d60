package benchtrue.screen;

import benchtrue.run.Shots;
import benchtrue.run.Snapshot;
import com.googlecode.lanterna.TerminalSize;
import com.googlecode.lanterna.graphics.BasicTextImage;
import java.util.concurrent.TimeUnit;
import org.openjdk.jmh.annotations.Benchmark;
import org.openjdk.jmh.annotations.BenchmarkMode;
import org.openjdk.jmh.annotations.Fork;
import org.openjdk.jmh.annotations.Measurement;
import org.openjdk.jmh.annotations.Mode;
import org.openjdk.jmh.annotations.OutputTimeUnit;
import org.openjdk.jmh.annotations.Param;
import org.openjdk.jmh.annotations.Scope;
import org.openjdk.jmh.annotations.Setup;
import org.openjdk.jmh.annotations.State;
import org.openjdk.jmh.annotations.Warmup;

/** Drawing one frame: at 20 a second 1 ms is 2 % of a core. */
@State(Scope.Thread)
@BenchmarkMode(Mode.AverageTime)
@OutputTimeUnit(TimeUnit.MICROSECONDS)
@Warmup(iterations = 3, time = 1)
@Measurement(iterations = 5, time = 1)
@Fork(1)
public class FrameBench {
    @Param({"80x24", "120x36", "200x60"})
    String size;

    private Snapshot snapshot;
    private Canvas canvas;

    @Setup
    public void replay() {
        snapshot = Shots.of("gear-pump", 402);
        String[] sides = size.split("x", -1);
        TerminalSize cells = new TerminalSize(Integer.parseInt(sides[0]), Integer.parseInt(sides[1]));
        canvas = new Canvas(new BasicTextImage(cells).newTextGraphics(), false, new Cells());
    }

    @Benchmark
    public void frame() {
        Frame.draw(canvas, Picture.shown(snapshot));
    }
}
