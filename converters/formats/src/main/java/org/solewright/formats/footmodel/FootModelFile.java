package org.solewright.formats.footmodel;

import java.io.IOException;
import java.nio.file.Path;
import java.util.Arrays;
import java.util.List;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.SegmentName;
import org.solewright.formats.footmodel.footxml.XmlFootModel;
import org.solewright.formats.io.AtomicOutput;
import org.solewright.formats.io.FormatException;

/** Foot models as XML, namespace {@code urn:solewright:foot-model:1}. */
public final class FootModelFile {

    private static final List<String> SEGMENTS =
            Arrays.stream(SegmentName.values()).map(SegmentName::word).toList();
    private static final List<String> BASES =
            Arrays.stream(Basis.values()).map(Basis::word).toList();

    private FootModelFile() {}

    /** Holds what is slow to make until a model is first read or written. */
    private static final class Holder {
        static final XmlBinding<XmlFootModel> BINDING = new XmlBinding<>(
                XmlFootModel.class,
                "footModel",
                "urn:solewright:foot-model:1",
                "foot-model-1.xsd",
                List.of(
                        new KnownWords("segment", "name", "segment", SEGMENTS),
                        new KnownWords("segment", "parent", "segment", SEGMENTS),
                        new KnownWords("joint", "proximal", "segment", SEGMENTS),
                        new KnownWords("joint", "distal", "segment", SEGMENTS),
                        new KnownWords("landmark", "segment", "segment", SEGMENTS),
                        new KnownWords("pad", "segment", "segment", SEGMENTS),
                        new KnownWords("mass", "basis", "basis", BASES)));
    }

    /**
     * Reads a model.
     *
     * @param file the XML file
     * @return the model
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is not a foot model, or says what no foot can be
     */
    public static FootModel read(Path file) throws IOException, FormatException {
        return new FootModelFromXml(Holder.BINDING.read(file)).model();
    }

    /**
     * Writes a model; the same model gives the same bytes.
     *
     * @param file target, replaced as a whole
     * @param model what is written
     * @throws IOException where it cannot be written
     */
    public static void write(Path file, FootModel model) throws IOException {
        AtomicOutput.write(file, bytes(model));
    }

    /**
     * The bytes that {@link #write} writes, for a caller that replaces several files together.
     *
     * @param model what is written
     * @return UTF-8 XML that its schema accepts
     */
    public static byte[] bytes(FootModel model) {
        return Holder.BINDING.render(FootModelToXml.model(model));
    }
}
