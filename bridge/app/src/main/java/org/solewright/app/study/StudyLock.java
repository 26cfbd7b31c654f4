package org.solewright.app.study;

import java.io.IOException;
import java.nio.channels.FileChannel;
import java.nio.channels.FileLock;
import java.nio.channels.OverlappingFileLockException;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import org.jspecify.annotations.Nullable;
import org.solewright.app.pipeline.UseCaseException;

/** Keeps a second run away from a folder. The lock is the system's and falls with its process, however that ends. */
final class StudyLock implements AutoCloseable {

    private static final String NAME = ".lock";
    private static final long PAUSE_MS = 200;

    private final Path folder;
    private final FileChannel channel;

    private StudyLock(Path folder, FileChannel channel) {
        this.folder = folder;
        this.channel = channel;
    }

    /** The folder that is kept. */
    Path folder() {
        return folder;
    }

    /**
     * Takes the lock of a folder.
     *
     * @param folder to be kept
     * @param isWaiting whether to wait for another run instead of refusing
     * @param whatToDo for the user where it is refused
     * @throws UseCaseException where another run holds it, or the folder cannot be written
     */
    static StudyLock of(Path folder, boolean isWaiting, String whatToDo) throws UseCaseException {
        FileChannel channel;
        try {
            channel = FileChannel.open(folder.resolve(NAME), StandardOpenOption.CREATE, StandardOpenOption.WRITE);
        } catch (IOException e) {
            throw StudyTask.unwritable(folder, e);
        }
        try {
            while (tried(channel) == null) {
                if (!isWaiting) {
                    channel.close();
                    throw new UseCaseException(
                            UseCaseException.Kind.OUTPUT, folder.toString(), "another run works on it", whatToDo);
                }
                Thread.sleep(PAUSE_MS);
            }
            return new StudyLock(folder, channel);
        } catch (IOException e) {
            throw StudyTask.unwritable(folder, e);
        } catch (InterruptedException e) {
            Thread.currentThread().interrupt();
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT, folder.toString(), "stopped while waiting", "run again", e);
        }
    }

    private static @Nullable FileLock tried(FileChannel channel) throws IOException {
        try {
            return channel.tryLock();
        } catch (OverlappingFileLockException e) {
            return null;
        }
    }

    @Override
    public void close() throws UseCaseException {
        try {
            channel.close();
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT, NAME, "cannot be closed (" + e.getMessage() + ")", "run again", e);
        }
    }
}
