package org.solewright.formats.footmodel;

import java.io.IOException;
import java.nio.file.Path;
import java.util.EnumSet;
import java.util.List;
import java.util.Optional;
import java.util.OptionalDouble;
import java.util.OptionalInt;
import java.util.Set;
import javax.xml.datatype.DatatypeConfigurationException;
import javax.xml.datatype.DatatypeFactory;
import org.jspecify.annotations.Nullable;
import org.solewright.domain.study.StudySettings;
import org.solewright.domain.study.StudySettings.Output;
import org.solewright.formats.footmodel.studyxml.XmlFileName;
import org.solewright.formats.footmodel.studyxml.XmlFilters;
import org.solewright.formats.footmodel.studyxml.XmlFoot;
import org.solewright.formats.footmodel.studyxml.XmlLaboratory;
import org.solewright.formats.footmodel.studyxml.XmlOutputs;
import org.solewright.formats.footmodel.studyxml.XmlStudy;
import org.solewright.formats.io.FormatException;

/** Settings of a study as XML, namespace {@code urn:solewright:study:1}. */
public final class StudyFile {

    private StudyFile() {}

    /** Holds what is slow to make until a study is first read or written. */
    private static final class Holder {
        static final XmlBinding<XmlStudy> BINDING = new XmlBinding<>(
                XmlStudy.class,
                "study",
                "urn:solewright:study:1",
                "study-1.xsd",
                List.of(
                        new KnownWords("laboratory", "events", "source of events", StudySettings.EVENTS),
                        new KnownWords("foot", "inertia", "table of inertia", StudySettings.INERTIA)));
    }

    /**
     * Reads settings.
     *
     * @param file the XML file
     * @return the settings
     * @throws IOException where the file cannot be opened or read
     * @throws FormatException where it is not as its schema says
     */
    public static StudySettings read(Path file) throws IOException, FormatException {
        XmlStudy xml = Holder.BINDING.read(file).root();
        XmlFilters filters = Optional.ofNullable(xml.getFilters()).orElseGet(XmlFilters::new);
        XmlLaboratory laboratory = Optional.ofNullable(xml.getLaboratory()).orElseGet(XmlLaboratory::new);
        XmlFoot foot = Optional.ofNullable(xml.getFoot()).orElseGet(XmlFoot::new);
        return new StudySettings(
                xml.getName(),
                xml.getDate() == null ? "" : xml.getDate().toXMLFormat(),
                xml.getLandmarks().getFile(),
                Optional.ofNullable(xml.getColumnMap()).map(XmlFileName::getFile),
                filters.getMarkerLowPass(),
                optional(laboratory.getMarkerRadius()),
                optional(laboratory.getFloor()),
                laboratory.isMirrored(),
                filters.isIgnoreFlags(),
                laboratory.getEvents(),
                foot.getSegments() == null ? OptionalInt.empty() : OptionalInt.of(foot.getSegments()),
                foot.getInertia(),
                foot.getFitTrials(),
                outputs(Optional.ofNullable(xml.getOutputs()).orElseGet(XmlOutputs::new)));
    }

    /**
     * The bytes of a file; the same settings give the same bytes.
     *
     * @param settings what is written
     * @return UTF-8 text
     */
    public static byte[] bytes(StudySettings settings) {
        XmlStudy xml = new XmlStudy();
        xml.setName(settings.name());
        if (!settings.date().isEmpty()) {
            try {
                xml.setDate(DatatypeFactory.newInstance().newXMLGregorianCalendar(settings.date()));
            } catch (DatatypeConfigurationException e) {
                throw new IllegalStateException("this Java has no XML dates", e);
            }
        }
        xml.setLandmarks(file(settings.landmarks()));
        settings.columnMap().ifPresent(f -> xml.setColumnMap(file(f)));
        XmlFilters filters = new XmlFilters();
        filters.setMarkerLowPass(settings.markerCutoff());
        filters.setIgnoreFlags(settings.isFlagIgnored());
        xml.setFilters(filters);
        XmlLaboratory laboratory = new XmlLaboratory();
        settings.markerRadius().ifPresent(laboratory::setMarkerRadius);
        settings.floor().ifPresent(laboratory::setFloor);
        laboratory.setMirrored(settings.isMirrored());
        laboratory.setEvents(settings.events());
        xml.setLaboratory(laboratory);
        XmlFoot foot = new XmlFoot();
        settings.segments().ifPresent(foot::setSegments);
        foot.setInertia(settings.inertia());
        foot.setFitTrials(settings.fitTrials());
        xml.setFoot(foot);
        XmlOutputs outputs = new XmlOutputs();
        outputs.setTransitions(settings.outputs().contains(Output.TRANSITIONS));
        outputs.setMeasures(settings.outputs().contains(Output.MEASURES));
        outputs.setPostures(settings.outputs().contains(Output.POSTURES));
        outputs.setFindings(settings.outputs().contains(Output.FINDINGS));
        outputs.setFeet(settings.outputs().contains(Output.FEET));
        xml.setOutputs(outputs);
        return Holder.BINDING.render(xml);
    }

    private static XmlFileName file(String name) {
        XmlFileName xml = new XmlFileName();
        xml.setFile(name);
        return xml;
    }

    private static OptionalDouble optional(@Nullable Double value) {
        return value == null ? OptionalDouble.empty() : OptionalDouble.of(value);
    }

    private static Set<Output> outputs(XmlOutputs xml) {
        Set<Output> outputs = EnumSet.noneOf(Output.class);
        add(outputs, Output.TRANSITIONS, xml.isTransitions());
        add(outputs, Output.MEASURES, xml.isMeasures());
        add(outputs, Output.POSTURES, xml.isPostures());
        add(outputs, Output.FINDINGS, xml.isFindings());
        add(outputs, Output.FEET, xml.isFeet());
        return outputs;
    }

    private static void add(Set<Output> outputs, Output output, boolean isAsked) {
        if (isAsked) {
            outputs.add(output);
        }
    }
}
