package org.solewright.app.study;

import java.io.IOException;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.List;
import org.solewright.app.pipeline.UseCaseException;
import org.solewright.formats.io.FormatException;
import org.solewright.formats.table.PlainTable;

/** Reads and writes tables; what goes wrong becomes one clear line. */
final class StudyFiles {

    private StudyFiles() {}

    static PlainTable.Content table(Path file) throws UseCaseException, FormatException {
        try {
            if (Files.isDirectory(file)) {
                throw new UseCaseException(UseCaseException.Kind.INPUT, file.toString(), "is a folder", "give a table");
            }
            return PlainTable.read(file);
        } catch (NoSuchFileException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT, file.toString(), "no such file", "check the name", e);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.INPUT,
                    file.toString(),
                    "cannot be read (" + e.getMessage() + ")",
                    "check that it is a readable file",
                    e);
        }
    }

    static void write(Path target, List<String> columns, PlainTable.Filler filler) throws UseCaseException {
        try {
            PlainTable.write(target, columns, filler);
        } catch (IOException e) {
            throw new UseCaseException(
                    UseCaseException.Kind.OUTPUT,
                    target.toString(),
                    "cannot be written (" + e.getMessage() + ")",
                    "name a file in an existing folder that may be written",
                    e);
        }
    }

    static double number(Path file, String column, String text) throws FormatException {
        try {
            return Double.parseDouble(text);
        } catch (NumberFormatException e) {
            throw new FormatException(
                    file.toString(),
                    column + " '" + text + "', expected a number",
                    "give the table as it was written",
                    e);
        }
    }

    /** A number, empty where it is none. */
    static String text(double value) {
        return Double.isFinite(value) ? Double.toString(value) : "";
    }
}
