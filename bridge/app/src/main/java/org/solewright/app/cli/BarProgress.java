package org.solewright.app.cli;

import java.io.PrintWriter;
import java.time.temporal.ChronoUnit;
import java.util.Optional;
import me.tongfei.progressbar.ProgressBar;
import me.tongfei.progressbar.ProgressBarBuilder;
import me.tongfei.progressbar.ProgressBarStyle;
import org.solewright.app.study.StudyListener;

/** A bar with rate and time left, on a terminal. */
final class BarProgress implements StudyListener {

    private static final int REFRESH_MS = 250;

    private final PrintWriter err;
    private Optional<ProgressBar> bar = Optional.empty();

    BarProgress(PrintWriter err) {
        this.err = err;
    }

    @Override
    public void begin(String what, int tasks) {
        finished();
        if (tasks > 0) {
            bar = Optional.of(new ProgressBarBuilder()
                    .setTaskName(what)
                    .setInitialMax(tasks)
                    .setUpdateIntervalMillis(REFRESH_MS)
                    .setStyle(ProgressBarStyle.ASCII)
                    .showSpeed()
                    .setSpeedUnit(ChronoUnit.SECONDS)
                    .setUnit(" trials", 1)
                    .build());
        }
    }

    @Override
    public void ended(String kind, String name, String state, String message) {
        if (!message.isEmpty()) {
            // A line of its own, below which the bar is drawn again.
            err.println("\r\u001b[K" + PlainProgress.line(kind, name, state, message));
        }
        bar.ifPresent(ProgressBar::step);
    }

    @Override
    public void finished() {
        bar.ifPresent(ProgressBar::close);
        bar = Optional.empty();
    }
}
