package org.solewright.formats.c3d;

import java.io.IOException;
import java.nio.ByteBuffer;
import java.nio.channels.FileChannel;
import java.nio.file.Files;
import java.nio.file.Path;
import java.nio.file.StandardOpenOption;
import java.util.Arrays;
import java.util.List;
import java.util.Optional;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.motion.RecordedEvent;
import org.solewright.domain.motion.Recording;
import org.solewright.formats.io.FormatException;

/**
 * A C3D file: its content in the file's own units, and what has to be said about it.
 *
 * @param name the file's name without folder
 * @param processor whose numbers it holds
 * @param isReal whether samples are reals, else integers
 * @param firstFrame number of the first frame
 * @param rate frames per second, Hz; NaN where no rate is stored
 * @param unit length unit as stored; empty where unknown
 * @param labels one per point; blank ones named {@code point_17}, repeated ones ended by {@code #2}
 * @param points samples; none where only the header was read
 * @param analogLabels one per channel
 * @param analogUnits one per channel
 * @param analog samples; none where only the header was read
 * @param events EVENT group first, then header events
 * @param parameters the parameter section
 * @param platforms force platforms as stored
 * @param storedFrames whole frames that the file holds, also where they were not read
 * @param headerWords the header block, 256 words without sign
 * @param findings what has to be said
 */
public record C3dFile(
        String name,
        Processor processor,
        boolean isReal,
        int firstFrame,
        double rate,
        String unit,
        List<String> labels,
        C3dPoints points,
        List<String> analogLabels,
        List<String> analogUnits,
        C3dAnalog analog,
        List<RecordedEvent> events,
        C3dParameters parameters,
        List<C3dPlatform> platforms,
        int storedFrames,
        List<Integer> headerWords,
        List<Finding> findings) {

    /** Far above the longest section seen, where nothing in the file says how far it reaches. */
    private static final int MOST_PARAMETER_BYTES = 1 << 24;

    /** Copies the lists. */
    public C3dFile {
        labels = List.copyOf(labels);
        analogLabels = List.copyOf(analogLabels);
        analogUnits = List.copyOf(analogUnits);
        events = List.copyOf(events);
        platforms = List.copyOf(platforms);
        headerWords = List.copyOf(headerWords);
        findings = List.copyOf(findings);
    }

    /**
     * Reads a whole file.
     *
     * @param file a C3D file
     * @return its content
     * @throws IOException where it cannot be read
     * @throws FormatException where it is no C3D file or ends before its first frame
     */
    public static C3dFile read(Path file) throws IOException, FormatException {
        return read(file, C3dReading.everything());
    }

    /**
     * Reads a part of a file: header, parameters and the samples that are asked for.
     *
     * @param file a C3D file
     * @param reading which points, whether analog samples, whether flags are obeyed
     * @return its content; labels and points are the wanted ones
     * @throws IOException where it cannot be read
     * @throws FormatException where it is no C3D file or ends before its first frame
     */
    public static C3dFile read(Path file, C3dReading reading) throws IOException, FormatException {
        return read(file, true, reading);
    }

    /**
     * Reads header and parameters alone and touches no data block.
     *
     * @param file a C3D file
     * @return its content without samples
     * @throws IOException where it cannot be read
     * @throws FormatException where it is no C3D file
     */
    public static C3dFile readHeader(Path file) throws IOException, FormatException {
        return read(file, false, C3dReading.everything());
    }

    /** Entries of the group EVENT that the file counts, also those without a time. */
    int countedEvents() {
        int stored = parameters.find("EVENT", "TIMES").map(t -> t.count() / 2).orElse(0);
        return (int) parameters
                .find("EVENT", "USED")
                .map(u -> Math.min(u.unsigned(0), stored))
                .filter(n -> !Double.isNaN(n))
                .map(n -> Math.max(0, n))
                .orElse((double) stored)
                .doubleValue();
    }

    private static C3dFile read(Path file, boolean withData, C3dReading reading) throws IOException, FormatException {
        Path last = file.getFileName();
        String name = last == null ? file.toString() : last.toString();
        if (Files.exists(file) && !Files.isRegularFile(file)) {
            throw new FormatException(file.toString(), "is not a regular file", "copy the recording to a file");
        }
        try (FileChannel channel = FileChannel.open(file, StandardOpenOption.READ)) {
            long size = channel.size();
            if (size > Integer.MAX_VALUE - 8) {
                throw new FormatException(
                        file.toString(),
                        "has " + size + " bytes, more than the 2 GB that can be read",
                        "split the recording");
            }
            byte[] bytes = beforeData(channel, (int) size);
            return new C3dReader(
                            file.toString(),
                            name,
                            bytes,
                            size,
                            withData ? Optional.of(channel) : Optional.empty(),
                            reading)
                    .read();
        }
    }

    /**
     * Header and parameters: the bytes before the first data block. Where the header puts the data before the parameters
     * or beyond the file, as far as parameters have been seen to reach.
     */
    private static byte[] beforeData(FileChannel channel, int size) throws IOException {
        byte[] header = bytes(channel, Math.min(size, C3dHeader.BYTES));
        if (header.length < C3dHeader.BYTES || header[0] == 0) {
            return header;
        }
        int parameters = ((header[0] & 0xff) - 1) * C3dHeader.BYTES;
        ByteBuffer key = ByteBuffer.allocate(1);
        boolean isMips = channel.read(key, parameters + 3L) == 1 && key.get(0) == Processor.MIPS.key();
        int a = header[16] & 0xff;
        int b = header[17] & 0xff;
        int data = ((isMips ? (a << 8) | b : (b << 8) | a) - 1) * C3dHeader.BYTES;
        boolean isBetween = data > parameters && data < size;
        return bytes(channel, isBetween ? data : Math.min(size, parameters + MOST_PARAMETER_BYTES));
    }

    private static byte[] bytes(FileChannel channel, int count) throws IOException {
        ByteBuffer buffer = ByteBuffer.allocate(count);
        int read = 0;
        while (read >= 0 && buffer.hasRemaining()) {
            read = channel.read(buffer, buffer.position());
        }
        return Arrays.copyOf(buffer.array(), buffer.position());
    }

    /**
     * Number of frames read.
     *
     * @return zero or more
     */
    public int frames() {
        return points.frames();
    }

    /**
     * How many points have a label in the file; the further ones are numbered.
     *
     * @return at most the number of points
     */
    public int storedLabels() {
        return Labels.stored(parameters, "POINT", labels.size());
    }

    /**
     * How many analog channels have a label in the file; the further ones are numbered.
     *
     * @return at most the number of channels
     */
    public int storedAnalogLabels() {
        return Labels.stored(parameters, "ANALOG", analogLabels.size());
    }

    /**
     * The content in SI units with platform loads on the subject.
     *
     * @return the recording; its findings are this file's and those of units and platforms
     */
    public Recording toRecording() {
        return C3dRecording.of(this);
    }

    /**
     * Platform loads, events and findings in SI units, without the points' tracks.
     *
     * @return as {@link #toRecording()}, with no points
     */
    public Recording withoutTracks() {
        return C3dRecording.withoutTracks(this);
    }
}
