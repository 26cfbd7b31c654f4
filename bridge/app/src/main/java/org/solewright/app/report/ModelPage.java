package org.solewright.app.report;

import java.util.ArrayList;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.function.Function;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.gait.ContactRow;
import org.solewright.domain.gait.Side;
import org.solewright.domain.gait.Use;
import org.solewright.domain.geometry.Vec3;

/** The page of one foot model: a view that rolls over a tracked stance, and every parameter with its basis in words. */
public final class ModelPage {

    private final FootModel model;
    private final Optional<FootRoll> roll;
    private final List<ContactRow> contacts;

    private ModelPage(FootModel model, Optional<FootRoll> roll, List<ContactRow> contacts) {
        this.model = model;
        this.roll = roll;
        this.contacts = List.copyOf(contacts);
    }

    /**
     * The page.
     *
     * @param model what was fitted
     * @param roll a stance of that foot; empty where none was tracked
     * @param contacts of both feet
     * @param cures what to do about a finding, by its code
     * @return ready to be set
     */
    public static Page of(
            FootModel model,
            Optional<FootRoll> roll,
            List<ContactRow> contacts,
            Function<String, Optional<String>> cures) {
        return new ModelPage(model, roll, contacts).page(cures);
    }

    private Page page(Function<String, Optional<String>> cures) {
        Side side = model.side();
        List<Section> sections = new ArrayList<>();
        sections.add(view());
        sections.add(new Section("segments", "Segments", List.of(segments()), false));
        sections.add(new Section("joints", "Joints", List.of(joints()), false));
        sections.add(new Section("rolling", "Rolling contact", rolling(), false));
        sections.add(Provenance.section(model.sources(), List.of(), model.version()));
        String id = model.subject().id();
        return new Page(
                "Foot model",
                "The " + side.word() + " foot" + (id.isBlank() ? "" : " of " + id),
                "A segmented foot with rolling contact, fitted to this subject; what was measured, what comes from other"
                        + " people's regressions and what was assumed is said with every number.",
                facts(),
                quality(),
                FindingGroup.of(model.findings(), cures),
                sections,
                false,
                model.cautions());
    }

    private List<Page.Fact> facts() {
        List<Page.Fact> facts = new ArrayList<>();
        String id = model.subject().id();
        facts.add(new Page.Fact("Subject", id.isBlank() ? "no identifier was given" : id));
        facts.add(new Page.Fact("Side", model.side().word()));
        facts.add(new Page.Fact("Population", model.subject().population().word()));
        facts.add(new Page.Fact("Body mass", quantity(model.subject().mass(), 1, "kg")));
        facts.add(new Page.Fact("Limb length", quantity(model.subject().limbLength(), 3, "m")));
        model.subject()
                .footLength()
                .ifPresent(q -> facts.add(new Page.Fact("Foot length", quantity(q, 3, "m") + ", heel to toe tip")));
        model.subject()
                .effectiveFootLength()
                .ifPresent(q -> facts.add(new Page.Fact(
                        "Effective foot length", quantity(q, 3, "m") + ", travel of the centre of pressure")));
        facts.add(new Page.Fact(
                "Recordings",
                Words.list(model.sources().stream()
                        .filter(s -> !s.role().equals("landmarks"))
                        .map(s -> PostureCostPage.fileName(s.path()))
                        .toList())));
        facts.add(new Page.Fact("Written by", "Solewright " + model.version()));
        return facts;
    }

    private static String quantity(Quantity q, int digits, String unit) {
        return Words.withSd(q.value(), q.sd(), digits) + " " + unit + ", "
                + q.basis().word();
    }

    private Quality quality() {
        QualityReview review = new QualityReview()
                .findings(model.findings())
                .contacts(contacts)
                .mass(quantity(model.subject().mass(), 1, "kg"));
        use(review, "Roll-over shape and arc of this foot", Use.ROLL_OVER);
        use(review, "Pivots of this sole", Use.PIVOTS);
        use(review, "Push-off work of this limb", Use.PUSH_OFF);
        use(review, "Collision work of this limb", Use.COLLISION);
        long observed = model.segments().stream().filter(Segment::observed).count();
        review.use(Quality.Usable.of(
                "Poses of this foot's segments",
                (int) observed,
                model.segments().size(),
                observed + " of " + model.segments().size()
                        + " segments were tracked in walking; the others follow their neighbours"));
        review.use(new Quality.Usable(
                "Contact stiffness and friction of a person's sole", "no", "pads are assumed, not measured"));
        return review.quality();
    }

    private void use(QualityReview review, String question, Use use) {
        List<String> missing = new ArrayList<>();
        int all = 0;
        for (ContactRow c : contacts) {
            if (c.side() == model.side() && !c.platforms().isEmpty()) {
                all++;
                if (!c.usedFor().contains(use)) {
                    missing.add(c.trial());
                }
            }
        }
        int there = all - missing.size();
        review.use(Quality.Usable.of(
                question,
                there,
                all,
                there + " of " + all + (all == 1 ? " stance" : " stances")
                        + (missing.isEmpty() ? "" : "; not " + Words.list(missing))));
    }

    private Section view() {
        FootShape shape = new FootShape(model);
        List<FootRoll.Instant> instants =
                roll.map(FootRoll::instants).orElseGet(() -> List.of(SceneData.standing(model, shape)));
        List<Block> blocks = new ArrayList<>();
        blocks.add(new Block.Text(roll.map(r -> "The foot rolls over the ground as it was tracked in " + r.trial()
                        + ": segments, joints with their axes, pads of the sole, the fitted arc, the centre of pressure"
                        + " and the load.")
                .orElse("No stance of this foot was tracked on a platform; it is shown as it stood.")));
        blocks.add(new Block.Text("The surfaces show where the segments are, not the shape of the skin."));
        if (roll.isPresent() && model.findings().stream().anyMatch(f -> f.code().equals("platform.height"))) {
            blocks.add(new Block.Text(
                    "Heights are drawn as recorded: the foot does not stand on the ground where the file puts"
                            + " its platforms too low or too high (see platform.height under findings)."));
        }
        blocks.add(new Block.Scene(
                "The " + model.side().word() + " foot in three dimensions",
                instants.size(),
                SceneData.of(model, shape, instants),
                new FootStill(model, shape).figures(instants)));
        return new Section("view", "The foot, rolling", blocks, false);
    }

    private Block.Table segments() {
        List<Block.Row> rows = new ArrayList<>();
        for (Segment s : model.segments()) {
            Vec3 c = s.centreOfMass().position();
            rows.add(Block.Row.of(
                    Words.capital(s.name().word()),
                    quantity(s.mass(), 3, "kg"),
                    quantity(s.length(), 3, "m"),
                    millimetres(c) + ", " + s.centreOfMass().basis().word(),
                    Words.number(1e4 * s.inertia().xx(), 2) + ", "
                            + Words.number(1e4 * s.inertia().yy(), 2) + ", "
                            + Words.number(1e4 * s.inertia().zz(), 2) + ", "
                            + s.inertiaBasis().word(),
                    s.observed() ? "tracked in walking" : "follows its neighbours"));
        }
        return new Block.Table(
                "Segments; axes x forward, y up, z to the subject's right, origin at the proximal joint",
                List.of(
                        "Segment",
                        "Mass",
                        "Length",
                        "Centre of mass x, y, z (mm)",
                        "Moments of inertia xx, yy, zz (10\u207b\u2074 kg m\u00b2)",
                        "Pose"),
                rows,
                false);
    }

    private static String millimetres(Vec3 v) {
        return Words.number(1000 * v.x(), 0) + ", " + Words.number(1000 * v.y(), 0) + ", "
                + Words.number(1000 * v.z(), 0);
    }

    private static String place(Located l) {
        return millimetres(l.position())
                + (l.sd().isPresent() ? " \u00b1 " + Words.number(1000 * l.sd().getAsDouble(), 0) : "") + ", "
                + l.basis().word();
    }

    private Block.Table joints() {
        List<Block.Row> rows = new ArrayList<>();
        for (Joint j : model.joints()) {
            List<String> axes = new ArrayList<>();
            for (Joint.Axis a : j.axes()) {
                axes.add(a.name() + " " + Words.number(a.direction().x(), 2) + ", "
                        + Words.number(a.direction().y(), 2) + ", "
                        + Words.number(a.direction().z(), 2) + ", "
                        + a.basis().word());
            }
            rows.add(Block.Row.of(
                    Words.capital(j.name()),
                    j.proximal().word() + " to " + j.distal().word() + ", "
                            + j.kind().word(),
                    place(j.centre()),
                    String.join("; ", axes),
                    j.range()
                            .map(r -> Words.number(Math.toDegrees(r.min()), 1) + " to "
                                    + Words.number(Math.toDegrees(r.max()), 1) + ", "
                                    + r.basis().word())
                            .orElse("not tracked"),
                    j.lock()
                            .map(l -> "at " + Words.number(Math.toDegrees(l.angle()), 1) + "\u00b0 over "
                                    + Words.number(l.stancePercent(), 0) + " % of stance, "
                                    + l.basis().word())
                            .orElse("none seen")));
        }
        return new Block.Table(
                "Joints; centre and axes in the proximal segment's axes",
                List.of("Joint", "Between", "Centre x, y, z (mm)", "Axes", "Range over stance (\u00b0)", "Lock"),
                rows,
                false);
    }

    private List<Block> rolling() {
        List<Block> blocks = new ArrayList<>();
        List<Block.Row> rows = new ArrayList<>();
        for (Rolling.Arc arc : model.rolling().arcs()) {
            boolean isFlat = !(arc.curvature() > 0);
            rows.add(Block.Row.of(
                    "Arc in the " + arc.frame().word() + " frame",
                    isFlat ? "flat" : Words.withSd(arc.radius(), arc.radiusSd(), 3),
                    Words.number(arc.arcLength(), 3),
                    Words.number(1000 * arc.rms(), 1),
                    isFlat
                            ? Words.NONE
                            : Words.number(
                                    arc.radius() / model.subject().limbLength().value(), 2),
                    Integer.toString(arc.steps())));
        }
        if (rows.isEmpty()) {
            blocks.add(new Block.Text("No stance of this foot could be used: the model has no rolling contact."));
        } else {
            blocks.add(new Block.Table(
                    "Arcs fitted to the roll-over shape, measured",
                    List.of(
                            "Arc",
                            "Radius (m)",
                            "Arc length (m)",
                            "Misfit (mm rms)",
                            "Radius over limb length",
                            "Stances"),
                    rows,
                    true));
        }
        List<Block.Row> pivots = new ArrayList<>();
        for (Rolling.Pivot p : model.rolling().pivots()) {
            pivots.add(Block.Row.of(
                    "Pivot " + (pivots.size() + 1),
                    Words.number(1000 * p.position(), 0),
                    Words.number(1000 * p.height(), 0),
                    Words.number(p.from(), 0) + " to " + Words.number(p.to(), 0)));
        }
        if (!pivots.isEmpty()) {
            blocks.add(new Block.Table(
                    "Pivots: places of the sole about which the limb vaults, measured",
                    List.of("Pivot", "From the heel (mm)", "Height (mm)", "Stance (%)"),
                    pivots,
                    true));
        }
        List<Block.Row> pads = new ArrayList<>();
        for (Pad p : model.pads()) {
            pads.add(Block.Row.of(
                    Words.capital(p.name().replace('_', ' ')),
                    p.segment().word(),
                    millimetres(p.centre()),
                    Words.number(1000 * p.radius(), 1),
                    Words.number(p.stiffness() / 1e6, 2),
                    Words.number(OptionalDouble.of(p.damping()), 1),
                    Words.number(p.friction(), 1),
                    p.basis().word()));
        }
        blocks.add(new Block.Table(
                "Pads of the sole",
                List.of(
                        "Pad",
                        "Segment",
                        "Centre x, y, z (mm)",
                        "Radius (mm)",
                        "Stiffness (10\u2076 N m\u207b\u00b9\u00b7\u2075)",
                        "Damping (s/m)",
                        "Friction",
                        "Basis"),
                pads,
                false));
        return blocks;
    }
}
