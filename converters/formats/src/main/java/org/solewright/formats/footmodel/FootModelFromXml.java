package org.solewright.formats.footmodel;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.Severity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Population;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.SegmentName;
import org.solewright.domain.foot.Setting;
import org.solewright.domain.foot.Sex;
import org.solewright.domain.foot.Subject;
import org.solewright.domain.gait.Side;
import org.solewright.domain.geometry.Vec3;
import org.solewright.formats.footmodel.footxml.XmlArc;
import org.solewright.formats.footmodel.footxml.XmlAxis;
import org.solewright.formats.footmodel.footxml.XmlFinding;
import org.solewright.formats.footmodel.footxml.XmlFootModel;
import org.solewright.formats.footmodel.footxml.XmlInertia;
import org.solewright.formats.footmodel.footxml.XmlJoint;
import org.solewright.formats.footmodel.footxml.XmlLandmark;
import org.solewright.formats.footmodel.footxml.XmlPad;
import org.solewright.formats.footmodel.footxml.XmlPlace;
import org.solewright.formats.footmodel.footxml.XmlQuantity;
import org.solewright.formats.footmodel.footxml.XmlRolling;
import org.solewright.formats.footmodel.footxml.XmlSegment;
import org.solewright.formats.footmodel.footxml.XmlSetting;
import org.solewright.formats.footmodel.footxml.XmlSourceFile;
import org.solewright.formats.footmodel.footxml.XmlSubject;
import org.solewright.formats.io.FormatException;

/**
 * From the generated classes to the domain's foot model. What a schema cannot say (an axis of unit length, a parent that
 * exists) the domain's constructors refuse; here that becomes a departure with its line.
 */
final class FootModelFromXml {

    private final XmlBinding.Parsed<XmlFootModel> parsed;

    FootModelFromXml(XmlBinding.Parsed<XmlFootModel> parsed) {
        this.parsed = parsed;
    }

    FootModel model() throws FormatException {
        XmlFootModel xml = parsed.root();
        Subject subject = subject(xml.getSubject());
        List<SourceFile> sources = new ArrayList<>();
        for (XmlSourceFile f : xml.getSources().getFile()) {
            sources.add(made(f, () -> new SourceFile(f.getRole(), f.getPath(), f.getSha256())));
        }
        List<Segment> segments = new ArrayList<>();
        for (XmlSegment s : xml.getSegments().getSegment()) {
            segments.add(made(s, () -> segment(s)));
        }
        List<Joint> joints = new ArrayList<>();
        for (XmlJoint j : xml.getJoints().getJoint()) {
            joints.add(made(j, () -> joint(j)));
        }
        List<LandmarkPosition> landmarks = new ArrayList<>();
        for (XmlLandmark l : xml.getLandmarks().getLandmark()) {
            landmarks.add(made(
                    l,
                    () -> new LandmarkPosition(
                            l.getName(), segmentName(l.getSegment()), new Vec3(l.getX(), l.getY(), l.getZ()))));
        }
        List<Pad> pads = new ArrayList<>();
        for (XmlPad p : xml.getContacts().getPad()) {
            pads.add(made(p, () -> pad(p)));
        }
        List<Finding> findings = new ArrayList<>();
        for (XmlFinding f : xml.getFindings().getFinding()) {
            findings.add(made(f, () -> finding(f)));
        }
        List<Setting> settings = new ArrayList<>();
        if (xml.getSettings() != null) {
            for (XmlSetting s : xml.getSettings().getSetting()) {
                settings.add(made(s, () -> new Setting(s.getName(), s.getValue())));
            }
        }
        Rolling rolling = made(xml.getRolling(), () -> rolling(xml.getRolling()));
        return made(
                xml,
                () -> new FootModel(
                        XmlWords.find(Side.values(), Side::word, xml.getSide()),
                        xml.getVersion(),
                        subject,
                        sources,
                        segments,
                        joints,
                        landmarks,
                        rolling,
                        pads,
                        findings,
                        xml.getCautions().getCaution(),
                        settings));
    }

    private <R> R made(Object element, Supplier<R> make) throws FormatException {
        try {
            return make.get();
        } catch (IllegalArgumentException e) {
            throw parsed.wrong(element, String.valueOf(e.getMessage()), e);
        }
    }

    private Subject subject(XmlSubject s) throws FormatException {
        return made(
                s,
                () -> new Subject(
                        s.getId(),
                        new Quantity(s.getMass(), basis(s.getMassBasis()), XmlWords.optional(s.getMassSd())),
                        optional("stature", s.getStature(), s.getStatureBasis(), s.getStatureSd()),
                        new Quantity(
                                s.getLimbLength(),
                                basis(s.getLimbLengthBasis()),
                                XmlWords.optional(s.getLimbLengthSd())),
                        optional("footLength", s.getFootLength(), s.getFootLengthBasis(), s.getFootLengthSd()),
                        optional(
                                "effectiveFootLength",
                                s.getEffectiveFootLength(),
                                s.getEffectiveFootLengthBasis(),
                                s.getEffectiveFootLengthSd()),
                        XmlWords.find(Population.values(), Population::word, s.getPopulation()),
                        Optional.ofNullable(s.getSex()).map(word -> XmlWords.find(Sex.values(), Sex::word, word))));
    }

    private static Optional<Quantity> optional(
            String name, @Nullable Double value, @Nullable String basis, @Nullable Double sd) {
        if (value == null) {
            return Optional.empty();
        }
        if (basis == null) {
            throw new IllegalArgumentException("attribute '" + name + "' without '" + name + "Basis'");
        }
        return Optional.of(new Quantity(value, basis(basis), XmlWords.optional(sd)));
    }

    private static Segment segment(XmlSegment s) {
        XmlInertia t = s.getInertia();
        return new Segment(
                segmentName(s.getName()),
                Optional.ofNullable(s.getParent()).map(FootModelFromXml::segmentName),
                quantity(s.getMass()),
                place(s.getCentreOfMass()),
                new InertiaTensor(t.getXx(), t.getYy(), t.getZz(), t.getXy(), t.getXz(), t.getYz()),
                basis(t.getBasis()),
                quantity(s.getLength()),
                Optional.ofNullable(s.isObserved()).orElse(false));
    }

    private static Joint joint(XmlJoint j) {
        return new Joint(
                j.getName(),
                segmentName(j.getProximal()),
                segmentName(j.getDistal()),
                XmlWords.find(Joint.Kind.values(), Joint.Kind::word, j.getKind()),
                place(j.getCentre()),
                j.getAxis().stream().map(FootModelFromXml::axis).toList(),
                Optional.ofNullable(j.getRange())
                        .map(r -> new Joint.Range(r.getMin(), r.getMax(), basis(r.getBasis()))),
                Optional.ofNullable(j.getLock())
                        .map(l -> new Joint.Lock(l.getAngle(), l.getStancePercent(), basis(l.getBasis()))));
    }

    private static Joint.Axis axis(XmlAxis a) {
        Joint.Axis axis = new Joint.Axis(
                a.getName(), new Vec3(a.getX(), a.getY(), a.getZ()), basis(a.getBasis()), XmlWords.optional(a.getSd()));
        if (a.getSource() == null) {
            return axis;
        }
        Joint.Axis.Source source = XmlWords.find(Joint.Axis.Source.values(), Joint.Axis.Source::word, a.getSource());
        return new Joint.Axis(axis.name(), axis.direction(), axis.basis(), axis.sd(), source);
    }

    private static Rolling rolling(XmlRolling r) {
        return new Rolling(
                r.getArc().stream().map(FootModelFromXml::arc).toList(),
                r.getOutline() == null
                        ? List.of()
                        : r.getOutline().getPoint().stream()
                                .map(p -> new Rolling.OutlinePoint(p.getX(), p.getY()))
                                .toList(),
                r.getPivots() == null
                        ? List.of()
                        : r.getPivots().getPivot().stream()
                                .map(p -> new Rolling.Pivot(p.getPosition(), p.getHeight(), p.getFrom(), p.getTo()))
                                .toList(),
                Optional.ofNullable(r.getCap())
                        .map(c -> new Rolling.Cap(
                                c.getRadius(), new Vec3(c.getCentreX(), c.getCentreY(), c.getCentreZ()), c.getRms())));
    }

    private static Rolling.Arc arc(XmlArc a) {
        return new Rolling.Arc(
                XmlWords.find(Rolling.Frame.values(), Rolling.Frame::word, a.getFrame()),
                a.getCurvature(),
                XmlWords.optional(a.getCurvatureSd()),
                XmlWords.optional(a.getRadiusSd()),
                XmlWords.optional(a.getCentreX()),
                XmlWords.optional(a.getCentreY()),
                a.getArcLength(),
                a.getRms(),
                a.getSteps());
    }

    private static Pad pad(XmlPad p) {
        return new Pad(
                p.getName(),
                segmentName(p.getSegment()),
                new Vec3(p.getX(), p.getY(), p.getZ()),
                p.getRadius(),
                p.getStiffness(),
                p.getDamping(),
                p.getFriction(),
                basis(p.getBasis()));
    }

    private static Finding finding(XmlFinding f) {
        return new Finding(
                f.getCode(),
                XmlWords.find(Severity.values(), Severity::word, f.getSeverity()),
                Optional.ofNullable(f.getWhere()).orElse(""),
                f.getValue());
    }

    private static Quantity quantity(XmlQuantity q) {
        return new Quantity(q.getValue(), basis(q.getBasis()), XmlWords.optional(q.getSd()));
    }

    private static Located place(XmlPlace p) {
        return new Located(new Vec3(p.getX(), p.getY(), p.getZ()), basis(p.getBasis()), XmlWords.optional(p.getSd()));
    }

    private static Basis basis(String word) {
        return XmlWords.find(Basis.values(), Basis::word, word);
    }

    private static SegmentName segmentName(String word) {
        return XmlWords.find(SegmentName.values(), SegmentName::word, word);
    }
}
