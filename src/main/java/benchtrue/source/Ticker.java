package benchtrue.source;

import java.util.concurrent.TimeUnit;

/** The monotonic clock of the machine, and waiting by it. */
interface Ticker {
    Ticker SYSTEM = new Ticker() {
        @Override
        public long nanos() {
            return System.nanoTime();
        }

        @Override
        public void sleep(long nanos) throws InterruptedException {
            TimeUnit.NANOSECONDS.sleep(nanos);
        }
    };

    /** Only differences mean something. */
    long nanos();

    /** Returns at once where {@code nanos} is not positive. */
    void sleep(long nanos) throws InterruptedException;
}
