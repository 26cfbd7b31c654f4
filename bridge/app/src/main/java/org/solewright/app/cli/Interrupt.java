package org.solewright.app.cli;

import java.io.PrintWriter;
import java.nio.file.Path;
import java.util.concurrent.CountDownLatch;
import java.util.concurrent.TimeUnit;
import java.util.concurrent.atomic.AtomicBoolean;

/** Lets a run end its trials in flight when the user interrupts it. */
final class Interrupt {

    private static final int LONGEST_S = 600;

    private final AtomicBoolean isAsked = new AtomicBoolean();
    private final CountDownLatch ended = new CountDownLatch(1);
    private final Thread hook;

    Interrupt(Path folder, PrintWriter err) {
        hook = new Thread(() -> {
            isAsked.set(true);
            err.println();
            err.println("solewright: " + folder + ": finishing the trials in flight ...");
            try {
                if (!ended.await(LONGEST_S, TimeUnit.SECONDS)) {
                    err.println("solewright: " + folder + ": given up on them: the same command goes on");
                }
            } catch (InterruptedException e) {
                Thread.currentThread().interrupt();
            }
            err.flush();
        });
        Runtime.getRuntime().addShutdownHook(hook);
    }

    boolean isAsked() {
        return isAsked.get();
    }

    void end() {
        ended.countDown();
        if (!isAsked()) {
            try {
                Runtime.getRuntime().removeShutdownHook(hook);
            } catch (IllegalStateException e) {
                // The process is ending at this moment; the hook has nothing to wait for any more.
                isAsked.set(true);
            }
        }
    }
}
