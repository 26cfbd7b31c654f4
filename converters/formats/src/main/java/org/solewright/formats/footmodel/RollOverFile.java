package org.solewright.formats.footmodel;

import java.util.List;
import java.util.Map;
import java.util.OptionalDouble;
import org.jspecify.annotations.Nullable;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.RollOverMeasure;
import org.solewright.domain.foot.RollOverSheet;
import org.solewright.domain.foot.Rolling;
import org.solewright.formats.footmodel.rolloverxml.XmlCautions;
import org.solewright.formats.footmodel.rolloverxml.XmlComparison;
import org.solewright.formats.footmodel.rolloverxml.XmlComparisons;
import org.solewright.formats.footmodel.rolloverxml.XmlEvidence;
import org.solewright.formats.footmodel.rolloverxml.XmlFinding;
import org.solewright.formats.footmodel.rolloverxml.XmlFindings;
import org.solewright.formats.footmodel.rolloverxml.XmlFoot;
import org.solewright.formats.footmodel.rolloverxml.XmlFrame;
import org.solewright.formats.footmodel.rolloverxml.XmlFrames;
import org.solewright.formats.footmodel.rolloverxml.XmlLength;
import org.solewright.formats.footmodel.rolloverxml.XmlLock;
import org.solewright.formats.footmodel.rolloverxml.XmlMeasure;
import org.solewright.formats.footmodel.rolloverxml.XmlMeasures;
import org.solewright.formats.footmodel.rolloverxml.XmlPivot;
import org.solewright.formats.footmodel.rolloverxml.XmlRollOver;
import org.solewright.formats.footmodel.rolloverxml.XmlSetting;
import org.solewright.formats.footmodel.rolloverxml.XmlSettings;
import org.solewright.formats.footmodel.rolloverxml.XmlSourceFile;
import org.solewright.formats.footmodel.rolloverxml.XmlSources;
import org.solewright.formats.footmodel.rolloverxml.XmlStance;
import org.solewright.formats.footmodel.rolloverxml.XmlSummary;
import org.solewright.formats.footmodel.rolloverxml.XmlValue;

/** Roll-over check sheets as XML, namespace {@code urn:solewright:rollover:1}. */
public final class RollOverFile {

    private static final List<Map.Entry<String, String>> FRAMES = List.of(
            Map.entry(
                    "foot at foot flat",
                    "x from heel to metatarsal heads at 20 to 50 % of stance, y up, origin below the heel there; the centre of"
                            + " pressure along the foot, behind the ankle and before the metatarsal line are told in it"),
            Map.entry(
                    "shank",
                    "sagittal plane of the walking frame, origin at the ankle centre, y from ankle to knee centre"),
            Map.entry(
                    "limb",
                    "sagittal plane of the walking frame, origin at the ankle centre, y from ankle to hip centre"));

    private RollOverFile() {}

    /** Holds what is slow to make until a sheet is first written. */
    private static final class Holder {
        static final XmlBinding<XmlRollOver> BINDING = new XmlBinding<>(
                XmlRollOver.class, "rollOver", "urn:solewright:rollover:1", "rollover-1.xsd", List.of());
    }

    /**
     * The bytes of a sheet's file; the same sheet gives the same bytes.
     *
     * @param sheet what is written
     * @return UTF-8 XML that its schema accepts
     */
    public static byte[] bytes(RollOverSheet sheet) {
        return Holder.BINDING.render(toXml(sheet));
    }

    private static XmlRollOver toXml(RollOverSheet sheet) {
        XmlRollOver xml = new XmlRollOver();
        xml.setVersion(sheet.version());
        xml.setSubject(XmlWords.legal(sheet.subject()));
        xml.setSources(sources(sheet));
        xml.setSettings(settings(sheet));
        xml.setFrames(frames());
        xml.setMeasures(measures());
        sheet.feet().forEach(f -> xml.getFoot().add(foot(f)));
        xml.setComparisons(new XmlComparisons());
        for (RollOverSheet.Comparison c : sheet.comparisons()) {
            XmlComparison comparison = new XmlComparison();
            comparison.setSource(c.source());
            comparison.setValue(c.text());
            xml.getComparisons().getComparison().add(comparison);
        }
        xml.setFindings(new XmlFindings());
        for (Finding f : sheet.findings()) {
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
        sheet.cautions().forEach(c -> xml.getCautions().getCaution().add(XmlWords.legal(c)));
        return xml;
    }

    private static XmlSources sources(RollOverSheet sheet) {
        XmlSources xml = new XmlSources();
        for (SourceFile f : sheet.sources()) {
            XmlSourceFile file = new XmlSourceFile();
            file.setRole(f.role());
            file.setPath(XmlWords.legal(f.path()));
            file.setSha256(f.sha256());
            xml.getFile().add(file);
        }
        return xml;
    }

    private static XmlSettings settings(RollOverSheet sheet) {
        XmlSettings xml = new XmlSettings();
        for (RollOverSheet.Setting s : sheet.settings()) {
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

    private static XmlMeasures measures() {
        XmlMeasures xml = new XmlMeasures();
        for (RollOverMeasure m : RollOverMeasure.values()) {
            XmlMeasure measure = new XmlMeasure();
            measure.setName(m.word());
            measure.setUnit(m.unit());
            measure.setValue(m.definition());
            xml.getMeasure().add(measure);
        }
        return xml;
    }

    private static XmlFoot foot(RollOverSheet.Foot foot) {
        XmlFoot xml = new XmlFoot();
        xml.setSide(foot.side().word());
        xml.getLength().add(length("limb", foot.limbLength()));
        foot.footLength().ifPresent(q -> xml.getLength().add(length("foot", q)));
        foot.stature().ifPresent(q -> xml.getLength().add(length("stature", q)));
        foot.observations().forEach(o -> xml.getObservation().add(XmlWords.legal(o)));
        foot.stances().forEach(s -> xml.getStance().add(stance(s)));
        xml.setSummary(new XmlSummary());
        foot.summary().forEach(v -> xml.getSummary().getValue().add(value(v)));
        for (Rolling.Pivot p : foot.pivots()) {
            XmlPivot pivot = new XmlPivot();
            pivot.setPosition(p.position());
            pivot.setHeight(p.height());
            pivot.setFrom(p.from());
            pivot.setTo(p.to());
            pivot.setBasis("measured");
            xml.getPivot().add(pivot);
        }
        for (RollOverSheet.Lock l : foot.locks()) {
            XmlLock lock = new XmlLock();
            lock.setJoint(l.joint());
            lock.setAngle(l.lock().angle());
            lock.setStancePercent(l.lock().stancePercent());
            lock.setBasis(l.lock().basis().word());
            xml.getLock().add(lock);
        }
        return xml;
    }

    private static XmlLength length(String of, Quantity q) {
        XmlLength xml = new XmlLength();
        xml.setOf(of);
        xml.setValue(q.value());
        xml.setBasis(q.basis().word());
        xml.setSd(orNull(q.sd()));
        return xml;
    }

    private static XmlStance stance(RollOverSheet.Stance s) {
        XmlStance xml = new XmlStance();
        xml.setTrial(XmlWords.legal(s.trial()));
        xml.setStep(s.step());
        xml.setStart(s.start());
        xml.setPlatforms(String.join(
                " ", s.platforms().stream().map(p -> Integer.toString(p)).toList()));
        xml.setWhole(s.isWhole());
        if (!s.why().isEmpty()) {
            xml.setWhy(XmlWords.legal(s.why()));
        }
        s.posture().ifPresent(xml::setPosture);
        if (!s.evidence().isEmpty()) {
            XmlEvidence evidence = new XmlEvidence();
            evidence.setValue(XmlWords.legal(s.evidence()));
            s.heelBearing().ifPresent(evidence::setBore);
            xml.setHeelBearing(evidence);
        }
        s.values().forEach(v -> xml.getValue().add(value(v)));
        return xml;
    }

    private static XmlValue value(RollOverSheet.Value v) {
        RollOverMeasure m = v.measure();
        XmlValue xml = new XmlValue();
        xml.setMeasure(m.word());
        xml.setValue(m.inUnit(v.value()));
        xml.setUnit(m.unit());
        xml.setBasis(v.basis().word());
        if (v.sd().isPresent()) {
            xml.setSd(m.inUnit(v.sd().getAsDouble()));
            xml.setSpread(v.spread().word());
        }
        xml.setN(v.n());
        v.low().ifPresent(x -> xml.setLow(m.inUnit(x)));
        v.high().ifPresent(x -> xml.setHigh(m.inUnit(x)));
        return xml;
    }

    private static @Nullable Double orNull(OptionalDouble value) {
        return value.isPresent() ? value.getAsDouble() : null;
    }
}
