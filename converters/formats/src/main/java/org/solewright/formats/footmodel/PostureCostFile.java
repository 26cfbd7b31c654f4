package org.solewright.formats.footmodel;

import java.io.IOException;
import java.nio.file.Path;
import java.util.List;
import java.util.Map;
import org.solewright.domain.cost.PostureCost;
import org.solewright.domain.cost.TransitionColumns;
import org.solewright.domain.cost.TransitionRow;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.SourceFile;
import org.solewright.formats.footmodel.costxml.XmlCautions;
import org.solewright.formats.footmodel.costxml.XmlCell;
import org.solewright.formats.footmodel.costxml.XmlColumn;
import org.solewright.formats.footmodel.costxml.XmlColumns;
import org.solewright.formats.footmodel.costxml.XmlFinding;
import org.solewright.formats.footmodel.costxml.XmlFindings;
import org.solewright.formats.footmodel.costxml.XmlFrame;
import org.solewright.formats.footmodel.costxml.XmlFrames;
import org.solewright.formats.footmodel.costxml.XmlPostureCost;
import org.solewright.formats.footmodel.costxml.XmlRow;
import org.solewright.formats.footmodel.costxml.XmlRows;
import org.solewright.formats.footmodel.costxml.XmlSetting;
import org.solewright.formats.footmodel.costxml.XmlSettings;
import org.solewright.formats.footmodel.costxml.XmlSourceFile;
import org.solewright.formats.footmodel.costxml.XmlSources;
import org.solewright.formats.io.AtomicOutput;

/** Posture-cost summaries as XML, namespace {@code urn:solewright:posture-cost:1}. */
public final class PostureCostFile {

    private static final List<Map.Entry<String, String>> FRAMES = List.of(
            Map.entry(
                    "walking",
                    "x forward along the pelvis's straight path of the pass, y up, z to the subject's right; forces act on"
                            + " the subject"),
            Map.entry(
                    "shank",
                    "sagittal plane of the walking frame, origin at the ankle centre, y from ankle to knee centre"),
            Map.entry(
                    "limb",
                    "sagittal plane of the walking frame, origin at the ankle centre, y from ankle to hip centre"));

    private PostureCostFile() {}

    /** Holds what is slow to make until a summary is first written. */
    private static final class Holder {
        static final XmlBinding<XmlPostureCost> BINDING = new XmlBinding<>(
                XmlPostureCost.class, "postureCost", "urn:solewright:posture-cost:1", "posture-cost-1.xsd", List.of());
    }

    /**
     * Writes a summary; the same summary gives the same bytes.
     *
     * @param file target, replaced as a whole
     * @param cost what is written
     * @throws IOException where it cannot be written
     */
    public static void write(Path file, PostureCost cost) throws IOException {
        AtomicOutput.write(file, bytes(cost));
    }

    /**
     * The bytes that {@link #write} writes, for a caller that replaces several files together.
     *
     * @param cost what is written
     * @return UTF-8 XML that its schema accepts
     */
    public static byte[] bytes(PostureCost cost) {
        return Holder.BINDING.render(toXml(cost));
    }

    private static XmlPostureCost toXml(PostureCost cost) {
        XmlPostureCost xml = new XmlPostureCost();
        xml.setVersion(cost.version());
        xml.setSources(sources(cost));
        xml.setSettings(settings(cost));
        xml.setFrames(frames());
        xml.setColumns(columns());
        xml.setRows(new XmlRows());
        cost.rows().forEach(r -> xml.getRows().getRow().add(row(r)));
        xml.setFindings(new XmlFindings());
        for (Finding f : cost.findings()) {
            XmlFinding finding = new XmlFinding();
            finding.setCode(f.code());
            finding.setSeverity(f.severity().word());
            if (!f.where().isEmpty()) {
                finding.setWhere(XmlWords.legal(f.where()));
            }
            finding.setValue(XmlWords.legal(f.message()));
            xml.getFindings().getFinding().add(finding);
        }
        xml.setCautions(new XmlCautions());
        cost.cautions().forEach(c -> xml.getCautions().getCaution().add(XmlWords.legal(c)));
        return xml;
    }

    private static XmlSources sources(PostureCost cost) {
        XmlSources xml = new XmlSources();
        for (SourceFile f : cost.sources()) {
            XmlSourceFile file = new XmlSourceFile();
            file.setRole(f.role());
            file.setPath(XmlWords.legal(f.path()));
            file.setSha256(f.sha256());
            xml.getFile().add(file);
        }
        return xml;
    }

    private static XmlSettings settings(PostureCost cost) {
        XmlSettings xml = new XmlSettings();
        for (PostureCost.Setting s : cost.settings()) {
            XmlSetting setting = new XmlSetting();
            setting.setName(s.name());
            setting.setValue(XmlWords.legal(s.value()));
            setting.setBasis(s.basis());
            xml.getSetting().add(setting);
        }
        return xml;
    }

    private static XmlFrames frames() {
        XmlFrames xml = new XmlFrames();
        for (Map.Entry<String, String> f : FRAMES) {
            XmlFrame frame = new XmlFrame();
            frame.setName(f.getKey());
            frame.setValue(f.getValue());
            xml.getFrame().add(frame);
        }
        return xml;
    }

    private static XmlColumns columns() {
        XmlColumns xml = new XmlColumns();
        for (String name : TransitionColumns.ALL) {
            XmlColumn column = new XmlColumn();
            column.setName(name);
            String unit = TransitionColumns.unit(name);
            if (!unit.isEmpty()) {
                column.setUnit(unit);
            }
            xml.getColumn().add(column);
        }
        return xml;
    }

    private static XmlRow row(TransitionRow row) {
        XmlRow xml = new XmlRow();
        row.cells().forEach((column, cell) -> {
            XmlCell c = new XmlCell();
            c.setColumn(column);
            c.setValue(XmlWords.legal(cell.text()));
            xml.getCell().add(c);
        });
        return xml;
    }
}
