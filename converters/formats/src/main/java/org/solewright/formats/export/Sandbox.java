package org.solewright.formats.export;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.net.URI;
import java.nio.file.Files;
import java.nio.file.NoSuchFileException;
import java.nio.file.Path;
import java.util.Objects;
import java.util.Optional;
import javax.xml.transform.Source;
import javax.xml.transform.sax.SAXSource;
import net.sf.saxon.lib.ResourceRequest;
import net.sf.saxon.lib.ResourceResolver;
import net.sf.saxon.trans.XPathException;
import org.solewright.formats.io.ClosedXml;
import org.solewright.formats.io.FormatException;
import org.xml.sax.InputSource;

/**
 * What a template may open: stylesheets of its own folder and of the library. The first refusal is kept, so that a
 * template that catches errors is refused all the same.
 */
final class Sandbox implements ResourceResolver {

    /** Base of relative names: no place of the machine. */
    static final String BASE = "template:/";

    private static final String KEEP = "keep to the model and to stylesheets of the template's folder";

    private final Template template;
    private volatile Optional<FormatException> refusal = Optional.empty();

    Sandbox(Template template) {
        this.template = template;
    }

    Optional<FormatException> refusal() {
        return refusal;
    }

    /** The refusal as the processor wants it. */
    XPathException refuse(String what) {
        return refuse(new FormatException(template.source(), "the template " + what + ", which is not allowed", KEEP));
    }

    private synchronized XPathException refuse(FormatException reason) {
        if (refusal.isEmpty()) {
            refusal = Optional.of(reason);
        }
        return new XPathException(reason.getMessage());
    }

    @Override
    public Source resolve(ResourceRequest request) throws XPathException {
        String wanted = request.relativeUri == null ? String.valueOf(request.uri) : request.relativeUri;
        if (!ResourceRequest.XSLT_NATURE.equals(request.nature)) {
            throw refuse("opens '" + wanted + "'");
        }
        String uri = String.valueOf(request.uri);
        byte[] ours = template.library().get(uri);
        if (ours != null) {
            return stylesheet(ours, uri);
        }
        Path folder = template.folder().orElse(null);
        if (folder == null || !uri.startsWith(BASE)) {
            throw refuse("includes '" + wanted + "' from outside its folder");
        }
        try {
            String name = Objects.requireNonNullElse(URI.create(uri).normalize().getPath(), "/")
                    .substring(1);
            Path file = folder.resolve(name).normalize();
            if (name.startsWith("/")
                    || !file.startsWith(folder)
                    || !file.toRealPath().startsWith(folder)) {
                throw refuse("includes '" + wanted + "' from outside its folder");
            }
            if (!Files.isRegularFile(file)) {
                throw refuse(missing(wanted));
            }
            return stylesheet(Template.bytes(file, template.source()), uri);
        } catch (NoSuchFileException e) {
            throw refuse(missing(wanted));
        } catch (FormatException e) {
            throw refuse(e);
        } catch (IOException | IllegalArgumentException e) {
            throw refuse(new FormatException(
                    template.source(), "the template includes '" + wanted + "', which cannot be read", KEEP, e));
        }
    }

    private FormatException missing(String wanted) {
        return new FormatException(
                template.source(),
                "the template includes '" + wanted + "', and its folder has no such file",
                "correct the name or put the file there");
    }

    /** A stylesheet past the closed parser. */
    static Source stylesheet(byte[] content, String uri) {
        InputSource input = new InputSource(new ByteArrayInputStream(content));
        input.setSystemId(uri);
        SAXSource source = new SAXSource(ClosedXml.reader(), input);
        source.setSystemId(uri);
        return source;
    }
}
