package org.solewright.app.pipeline;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.List;
import java.util.Map;
import org.solewright.formats.io.AtomicOutput;

/** The folder that a command writes to. Every file is written beside its name and then renamed. */
final class OutputFolder {

    private final Path folder;
    private final List<Path> inputs;

    private OutputFolder(Path folder, List<Path> inputs) {
        this.folder = folder;
        this.inputs = List.copyOf(inputs);
    }

    /**
     * Makes the folder where it is missing.
     *
     * @param folder may exist
     * @param inputs files of the same call, which are never replaced
     * @return the folder
     * @throws UseCaseException where it cannot be made or written
     */
    static OutputFolder of(Path folder, List<Path> inputs) throws UseCaseException {
        try {
            Files.createDirectories(folder);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    folder.toString(),
                    "cannot be made a folder (" + e.getMessage() + ")",
                    "give another --out",
                    e);
        }
        if (!Files.isWritable(folder)) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT, folder.toString(), "cannot be written", "give another --out");
        }
        return new OutputFolder(folder, inputs);
    }

    /**
     * Writes all files of a result; none where one of them would replace an input of the call.
     *
     * @param files name and content, in the order of writing
     * @return the files as the user named their folder
     * @throws UseCaseException where one cannot be written
     */
    List<Path> write(Map<String, byte[]> files) throws UseCaseException {
        for (String name : files.keySet()) {
            checkNoInput(folder.resolve(name));
        }
        List<Path> written = new ArrayList<>();
        for (Map.Entry<String, byte[]> e : files.entrySet()) {
            Path file = folder.resolve(e.getKey());
            try {
                AtomicOutput.write(file, e.getValue());
            } catch (IOException x) {
                throw new UseCaseException(
                        UseCaseException.Kind.OUTPUT,
                        file.toString(),
                        "cannot be written (" + x.getMessage() + ")",
                        "free space or give another --out",
                        x);
            }
            written.add(file);
        }
        return written;
    }

    /**
     * Where a file of this folder will lie.
     *
     * @param name of the file
     * @return its place, which is no input of the call
     * @throws UseCaseException where it would replace an input
     */
    Path place(String name) throws UseCaseException {
        Path file = folder.resolve(name);
        checkNoInput(file);
        return file;
    }

    private void checkNoInput(Path file) throws UseCaseException {
        for (Path input : inputs) {
            try {
                if (Files.exists(file) && Files.exists(input) && Files.isSameFile(file, input)) {
                    throw new UseCaseException(
                            UseCaseException.Kind.OUTPUT,
                            file.toString(),
                            "is an input of this call and would be replaced",
                            "give another --out");
                }
            } catch (IOException e) {
                throw new UseCaseException(
                        UseCaseException.Kind.OUTPUT,
                        file.toString(),
                        "cannot be compared with the inputs (" + e.getMessage() + ")",
                        "give another --out",
                        e);
            }
        }
    }
}
