package org.solewright.formats.footmodel;

import org.solewright.domain.finding.Basis;
import org.solewright.domain.finding.Finding;
import org.solewright.domain.finding.Quantity;
import org.solewright.domain.finding.SourceFile;
import org.solewright.domain.foot.FootModel;
import org.solewright.domain.foot.InertiaTensor;
import org.solewright.domain.foot.Joint;
import org.solewright.domain.foot.LandmarkPosition;
import org.solewright.domain.foot.Located;
import org.solewright.domain.foot.Pad;
import org.solewright.domain.foot.Rolling;
import org.solewright.domain.foot.Segment;
import org.solewright.domain.foot.Setting;
import org.solewright.domain.foot.Subject;
import org.solewright.formats.footmodel.footxml.XmlArc;
import org.solewright.formats.footmodel.footxml.XmlAxis;
import org.solewright.formats.footmodel.footxml.XmlCap;
import org.solewright.formats.footmodel.footxml.XmlCautions;
import org.solewright.formats.footmodel.footxml.XmlContacts;
import org.solewright.formats.footmodel.footxml.XmlFinding;
import org.solewright.formats.footmodel.footxml.XmlFindings;
import org.solewright.formats.footmodel.footxml.XmlFootModel;
import org.solewright.formats.footmodel.footxml.XmlInertia;
import org.solewright.formats.footmodel.footxml.XmlJoint;
import org.solewright.formats.footmodel.footxml.XmlJoints;
import org.solewright.formats.footmodel.footxml.XmlLandmark;
import org.solewright.formats.footmodel.footxml.XmlLandmarks;
import org.solewright.formats.footmodel.footxml.XmlLock;
import org.solewright.formats.footmodel.footxml.XmlOutline;
import org.solewright.formats.footmodel.footxml.XmlOutlinePoint;
import org.solewright.formats.footmodel.footxml.XmlPad;
import org.solewright.formats.footmodel.footxml.XmlPivot;
import org.solewright.formats.footmodel.footxml.XmlPivots;
import org.solewright.formats.footmodel.footxml.XmlPlace;
import org.solewright.formats.footmodel.footxml.XmlQuantity;
import org.solewright.formats.footmodel.footxml.XmlRange;
import org.solewright.formats.footmodel.footxml.XmlRolling;
import org.solewright.formats.footmodel.footxml.XmlSegment;
import org.solewright.formats.footmodel.footxml.XmlSegments;
import org.solewright.formats.footmodel.footxml.XmlSetting;
import org.solewright.formats.footmodel.footxml.XmlSettings;
import org.solewright.formats.footmodel.footxml.XmlSourceFile;
import org.solewright.formats.footmodel.footxml.XmlSources;
import org.solewright.formats.footmodel.footxml.XmlSubject;

/** From the domain's foot model to the generated classes; nothing is computed. */
final class FootModelToXml {

    private FootModelToXml() {}

    static XmlFootModel model(FootModel model) {
        XmlFootModel xml = new XmlFootModel();
        xml.setSide(model.side().word());
        xml.setVersion(model.version());
        xml.setSubject(subject(model.subject()));
        xml.setSources(new XmlSources());
        for (SourceFile file : model.sources()) {
            XmlSourceFile f = new XmlSourceFile();
            f.setRole(file.role());
            f.setPath(XmlWords.legal(file.path()));
            f.setSha256(file.sha256());
            xml.getSources().getFile().add(f);
        }
        if (!model.settings().isEmpty()) {
            xml.setSettings(new XmlSettings());
            for (Setting setting : model.settings()) {
                XmlSetting s = new XmlSetting();
                s.setName(XmlWords.legal(setting.name()));
                s.setValue(XmlWords.legal(setting.value()));
                xml.getSettings().getSetting().add(s);
            }
        }
        xml.setSegments(new XmlSegments());
        model.segments().forEach(s -> xml.getSegments().getSegment().add(segment(s)));
        xml.setJoints(new XmlJoints());
        model.joints().forEach(j -> xml.getJoints().getJoint().add(joint(j)));
        xml.setLandmarks(new XmlLandmarks());
        model.landmarks().forEach(l -> xml.getLandmarks().getLandmark().add(landmark(l)));
        xml.setRolling(rolling(model.rolling()));
        xml.setContacts(new XmlContacts());
        model.pads().forEach(p -> xml.getContacts().getPad().add(pad(p)));
        xml.setFindings(new XmlFindings());
        model.findings().forEach(f -> xml.getFindings().getFinding().add(finding(f)));
        xml.setCautions(new XmlCautions());
        model.cautions().forEach(c -> xml.getCautions().getCaution().add(XmlWords.legal(c)));
        return xml;
    }

    private static XmlSubject subject(Subject s) {
        XmlSubject xml = new XmlSubject();
        xml.setId(XmlWords.legal(s.id()));
        xml.setMass(s.mass().value());
        xml.setMassBasis(s.mass().basis().word());
        XmlWords.put(s.mass().sd(), xml::setMassSd);
        s.stature().ifPresent(q -> {
            xml.setStature(q.value());
            xml.setStatureBasis(q.basis().word());
            XmlWords.put(q.sd(), xml::setStatureSd);
        });
        xml.setLimbLength(s.limbLength().value());
        xml.setLimbLengthBasis(s.limbLength().basis().word());
        XmlWords.put(s.limbLength().sd(), xml::setLimbLengthSd);
        s.footLength().ifPresent(q -> {
            xml.setFootLength(q.value());
            xml.setFootLengthBasis(q.basis().word());
            XmlWords.put(q.sd(), xml::setFootLengthSd);
        });
        s.effectiveFootLength().ifPresent(q -> {
            xml.setEffectiveFootLength(q.value());
            xml.setEffectiveFootLengthBasis(q.basis().word());
            XmlWords.put(q.sd(), xml::setEffectiveFootLengthSd);
        });
        xml.setPopulation(s.population().word());
        s.sex().ifPresent(sex -> xml.setSex(sex.word()));
        return xml;
    }

    private static XmlSegment segment(Segment s) {
        XmlSegment xml = new XmlSegment();
        xml.setName(s.name().word());
        s.parent().ifPresent(p -> xml.setParent(p.word()));
        xml.setObserved(s.observed());
        xml.setMass(quantity(s.mass()));
        xml.setCentreOfMass(place(s.centreOfMass()));
        xml.setInertia(inertia(s.inertia(), s.inertiaBasis()));
        xml.setLength(quantity(s.length()));
        return xml;
    }

    private static XmlQuantity quantity(Quantity q) {
        XmlQuantity xml = new XmlQuantity();
        xml.setValue(q.value());
        xml.setBasis(q.basis().word());
        XmlWords.put(q.sd(), xml::setSd);
        return xml;
    }

    private static XmlPlace place(Located l) {
        XmlPlace xml = new XmlPlace();
        xml.setX(l.position().x());
        xml.setY(l.position().y());
        xml.setZ(l.position().z());
        xml.setBasis(l.basis().word());
        XmlWords.put(l.sd(), xml::setSd);
        return xml;
    }

    private static XmlInertia inertia(InertiaTensor t, Basis basis) {
        XmlInertia xml = new XmlInertia();
        xml.setXx(t.xx());
        xml.setYy(t.yy());
        xml.setZz(t.zz());
        xml.setXy(t.xy());
        xml.setXz(t.xz());
        xml.setYz(t.yz());
        xml.setBasis(basis.word());
        return xml;
    }

    private static XmlJoint joint(Joint j) {
        XmlJoint xml = new XmlJoint();
        xml.setName(j.name());
        xml.setProximal(j.proximal().word());
        xml.setDistal(j.distal().word());
        xml.setKind(j.kind().word());
        xml.setCentre(place(j.centre()));
        j.axes().forEach(a -> xml.getAxis().add(axis(a)));
        j.range().ifPresent(r -> {
            XmlRange range = new XmlRange();
            range.setMin(r.min());
            range.setMax(r.max());
            range.setBasis(r.basis().word());
            xml.setRange(range);
        });
        j.lock().ifPresent(l -> {
            XmlLock lock = new XmlLock();
            lock.setAngle(l.angle());
            lock.setStancePercent(l.stancePercent());
            lock.setBasis(l.basis().word());
            xml.setLock(lock);
        });
        return xml;
    }

    private static XmlAxis axis(Joint.Axis a) {
        XmlAxis xml = new XmlAxis();
        xml.setName(a.name());
        xml.setX(a.direction().x());
        xml.setY(a.direction().y());
        xml.setZ(a.direction().z());
        xml.setBasis(a.basis().word());
        XmlWords.put(a.sd(), xml::setSd);
        xml.setSource(a.source().word());
        return xml;
    }

    private static XmlLandmark landmark(LandmarkPosition l) {
        XmlLandmark xml = new XmlLandmark();
        xml.setName(l.name());
        xml.setSegment(l.segment().word());
        xml.setX(l.position().x());
        xml.setY(l.position().y());
        xml.setZ(l.position().z());
        return xml;
    }

    private static XmlRolling rolling(Rolling r) {
        XmlRolling xml = new XmlRolling();
        r.arcs().forEach(a -> xml.getArc().add(arc(a)));
        if (!r.outline().isEmpty()) {
            xml.setOutline(new XmlOutline());
            r.outline().forEach(p -> {
                XmlOutlinePoint point = new XmlOutlinePoint();
                point.setX(p.x());
                point.setY(p.y());
                xml.getOutline().getPoint().add(point);
            });
        }
        if (!r.pivots().isEmpty()) {
            xml.setPivots(new XmlPivots());
            r.pivots().forEach(p -> xml.getPivots().getPivot().add(pivot(p)));
        }
        r.cap().ifPresent(c -> xml.setCap(cap(c)));
        return xml;
    }

    private static XmlArc arc(Rolling.Arc a) {
        XmlArc xml = new XmlArc();
        xml.setFrame(a.frame().word());
        xml.setRadius(a.radius());
        XmlWords.put(a.radiusSd(), xml::setRadiusSd);
        xml.setCurvature(a.curvature());
        XmlWords.put(a.curvatureSd(), xml::setCurvatureSd);
        XmlWords.put(a.centreX(), xml::setCentreX);
        XmlWords.put(a.centreY(), xml::setCentreY);
        xml.setArcLength(a.arcLength());
        xml.setRms(a.rms());
        xml.setSteps(a.steps());
        xml.setBasis(Basis.MEASURED.word());
        return xml;
    }

    private static XmlPivot pivot(Rolling.Pivot p) {
        XmlPivot xml = new XmlPivot();
        xml.setPosition(p.position());
        xml.setHeight(p.height());
        xml.setFrom(p.from());
        xml.setTo(p.to());
        return xml;
    }

    private static XmlCap cap(Rolling.Cap c) {
        XmlCap xml = new XmlCap();
        xml.setRadius(c.radius());
        xml.setCentreX(c.centre().x());
        xml.setCentreY(c.centre().y());
        xml.setCentreZ(c.centre().z());
        xml.setRms(c.rms());
        return xml;
    }

    private static XmlPad pad(Pad p) {
        XmlPad xml = new XmlPad();
        xml.setName(p.name());
        xml.setSegment(p.segment().word());
        xml.setX(p.centre().x());
        xml.setY(p.centre().y());
        xml.setZ(p.centre().z());
        xml.setRadius(p.radius());
        xml.setStiffness(p.stiffness());
        xml.setDamping(p.damping());
        xml.setFriction(p.friction());
        xml.setBasis(p.basis().word());
        return xml;
    }

    private static XmlFinding finding(Finding f) {
        XmlFinding xml = new XmlFinding();
        xml.setCode(f.code());
        xml.setSeverity(f.severity().word());
        if (!f.where().isEmpty()) {
            xml.setWhere(XmlWords.legal(f.where()));
        }
        xml.setValue(XmlWords.legal(f.message()));
        return xml;
    }
}
