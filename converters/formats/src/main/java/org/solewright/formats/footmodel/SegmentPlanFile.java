package org.solewright.formats.footmodel;

import java.io.IOException;
import java.nio.file.Path;
import java.util.ArrayList;
import java.util.Arrays;
import java.util.List;
import java.util.Locale;
import java.util.Optional;
import java.util.function.Supplier;
import org.jspecify.annotations.Nullable;
import org.solewright.domain.finding.Basis;
import org.solewright.domain.foot.ChainPlan;
import org.solewright.domain.foot.Landmark;
import org.solewright.domain.foot.SegmentName;
import org.solewright.formats.footmodel.planxml.XmlAxis;
import org.solewright.formats.footmodel.planxml.XmlJoint;
import org.solewright.formats.footmodel.planxml.XmlPlace;
import org.solewright.formats.footmodel.planxml.XmlSegment;
import org.solewright.formats.footmodel.planxml.XmlSegmentPlan;
import org.solewright.formats.footmodel.planxml.XmlShape;
import org.solewright.formats.io.FormatException;

/** Segment plans as XML, namespace {@code urn:solewright:segment-plan:1}. */
public final class SegmentPlanFile {

    private static final List<String> SEGMENTS = Arrays.stream(SegmentName.values())
            .filter(s -> s != SegmentName.SHANK)
            .map(SegmentName::word)
            .toList();
    private static final List<String> LANDMARKS =
            Arrays.stream(Landmark.values()).map(Landmark::word).toList();
    private static final List<String> POINTS = Arrays.stream(Landmark.values())
            .filter(l -> !l.isCluster())
            .map(Landmark::word)
            .toList();

    private final XmlBinding.Parsed<XmlSegmentPlan> parsed;

    private SegmentPlanFile(XmlBinding.Parsed<XmlSegmentPlan> parsed) {
        this.parsed = parsed;
    }

    /** Holds what is slow to make until a plan is first read. */
    private static final class Holder {
        static final XmlBinding<XmlSegmentPlan> BINDING = new XmlBinding<>(
                XmlSegmentPlan.class,
                "segmentPlan",
                "urn:solewright:segment-plan:1",
                "segment-plan-1.xsd",
                List.of(
                        new KnownWords("segment", "name", "segment", SEGMENTS),
                        new KnownWords("centre", "landmark", "landmark", POINTS),
                        new KnownWords("centre", "other", "landmark", POINTS),
                        new KnownWords("tip", "landmark", "landmark", POINTS),
                        new KnownWords("tip", "other", "landmark", POINTS),
                        new KnownWords("axis", "from", "landmark", POINTS),
                        new KnownWords("axis", "to", "landmark", POINTS),
                        new KnownWords("carries", "landmark", "landmark", LANDMARKS)));
    }

    /**
     * Reads a plan.
     *
     * @param file the XML file
     * @return the plan
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is not a segment plan, or one that makes no chain
     */
    public static ChainPlan read(Path file) throws IOException, FormatException {
        return new SegmentPlanFile(Holder.BINDING.read(file)).plan();
    }

    private ChainPlan plan() throws FormatException {
        XmlSegmentPlan xml = parsed.root();
        List<ChainPlan.Part> parts = new ArrayList<>();
        for (XmlSegment s : xml.getSegment()) {
            Optional<ChainPlan.Hinge> joint = joint(s.getJoint());
            ChainPlan.Shape shape = shape(s.getShape());
            Optional<ChainPlan.MassShare> mass = mass(s.getShape());
            parts.add(made(
                    s,
                    () -> new ChainPlan.Part(
                            SegmentName.ofWord(s.getName()).orElseThrow(),
                            joint,
                            shape,
                            mass,
                            s.getCarries().stream()
                                    .map(c -> landmark(c.getLandmark()))
                                    .toList())));
        }
        ChainPlan.Place tip = place(xml.getTip());
        return made(xml, () -> new ChainPlan(Optional.ofNullable(xml.getName()).orElse(""), parts, tip));
    }

    private <R> R made(Object element, Supplier<R> make) throws FormatException {
        try {
            return make.get();
        } catch (IllegalArgumentException e) {
            throw parsed.wrong(element, String.valueOf(e.getMessage()), e);
        }
    }

    /** The guard has let no unknown name pass. */
    private static Landmark landmark(String word) {
        return Landmark.ofWord(word).orElseThrow();
    }

    private ChainPlan.Place place(XmlPlace xml) throws FormatException {
        Optional<Landmark> other = Optional.ofNullable(xml.getOther()).map(SegmentPlanFile::landmark);
        Landmark one = landmark(xml.getLandmark());
        if (other.isPresent() && other.get() == one) {
            throw parsed.wrong(xml, "landmark '" + one.word() + "' twice, expected two different ones or one alone");
        }
        return new ChainPlan.Place(one, other);
    }

    private Optional<ChainPlan.Hinge> joint(@Nullable XmlJoint xml) throws FormatException {
        if (xml == null) {
            return Optional.empty();
        }
        return Optional.of(new ChainPlan.Hinge(xml.getName(), place(xml.getCentre()), axis(xml.getAxis())));
    }

    private ChainPlan.Axis axis(XmlAxis xml) throws FormatException {
        String from = xml.getFrom();
        String to = xml.getTo();
        String direction = xml.getDirection();
        if (from != null && to != null && direction == null && !from.equals(to)) {
            return new ChainPlan.Axis.Through(landmark(from), landmark(to));
        }
        if (from == null && to == null && direction != null) {
            return new ChainPlan.Axis.Along(ChainPlan.Direction.valueOf(direction.toUpperCase(Locale.ROOT)));
        }
        throw parsed.wrong(xml, "an axis with neither two different landmarks from and to nor a direction alone");
    }

    private ChainPlan.Shape shape(XmlShape xml) throws FormatException {
        return made(
                xml,
                () -> new ChainPlan.Shape(
                        xml.getProximalWidth(), xml.getProximalHeight(), xml.getDistalWidth(), xml.getDistalHeight()));
    }

    private Optional<ChainPlan.MassShare> mass(XmlShape xml) throws FormatException {
        Double share = xml.getMassShare();
        String basis = xml.getMassBasis();
        if (share == null) {
            if (basis != null) {
                throw parsed.wrong(xml, "attribute 'massBasis' without 'massShare'");
            }
            return Optional.empty();
        }
        double value = share;
        return Optional.of(made(
                xml,
                () -> new ChainPlan.MassShare(
                        value, basis == null ? Basis.ASSUMED : XmlWords.find(Basis.values(), Basis::word, basis))));
    }
}
