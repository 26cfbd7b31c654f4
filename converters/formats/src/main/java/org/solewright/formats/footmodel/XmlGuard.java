package org.solewright.formats.footmodel;

import java.util.List;
import org.solewright.formats.io.Spelling;
import org.xml.sax.Attributes;
import org.xml.sax.Locator;
import org.xml.sax.SAXException;
import org.xml.sax.SAXParseException;
import org.xml.sax.XMLReader;
import org.xml.sax.helpers.LocatorImpl;
import org.xml.sax.helpers.XMLFilterImpl;

/**
 * Stands before the schema: bounds the nesting, names a foreign root element as such and an unknown word with the word
 * that was probably meant.
 */
final class XmlGuard extends XMLFilterImpl {

    private static final int DEEPEST = 32;

    private final String rootName;
    private final String namespace;
    private final List<KnownWords> words;
    private int depth;
    private boolean rootSeen;
    private int line = 1;
    private Locator locator = new LocatorImpl();

    XmlGuard(XMLReader parent, String rootName, String namespace, List<KnownWords> words) {
        super(parent);
        this.rootName = rootName;
        this.namespace = namespace;
        this.words = words;
    }

    /** A departure that has a better hint than "correct the file". */
    static final class Refusal extends SAXParseException {

        private static final long serialVersionUID = 1L;

        private final String whatToDo;

        Refusal(String message, String whatToDo, Locator locator) {
            super(message, locator);
            this.whatToDo = whatToDo;
        }

        String whatToDo() {
            return whatToDo;
        }
    }

    boolean isRootSeen() {
        return rootSeen;
    }

    int line() {
        return line;
    }

    @Override
    public void setDocumentLocator(Locator newLocator) {
        locator = newLocator;
        super.setDocumentLocator(newLocator);
    }

    @Override
    public void startElement(String uri, String localName, String qName, Attributes attributes) throws SAXException {
        line = locator.getLineNumber();
        if (!rootSeen) {
            checkRoot(uri, localName);
            rootSeen = true;
        }
        if (++depth > DEEPEST) {
            throw new Refusal(
                    "elements are nested deeper than " + DEEPEST + ", expected " + rootName, "check the file", locator);
        }
        for (KnownWords known : words) {
            checkWord(known, localName, attributes);
        }
        super.startElement(uri, localName, qName, attributes);
    }

    @Override
    public void endElement(String uri, String localName, String qName) throws SAXException {
        depth--;
        super.endElement(uri, localName, qName);
    }

    private void checkRoot(String uri, String localName) throws SAXException {
        if (!localName.equals(rootName) || !uri.equals(namespace)) {
            throw new Refusal(
                    "root element '" + localName + "' of namespace '" + uri + "', expected '" + rootName + "' of '"
                            + namespace + "'",
                    "give a file of that kind",
                    locator);
        }
    }

    private void checkWord(KnownWords known, String element, Attributes attributes) throws SAXException {
        String value = known.element().equals(element) ? attributes.getValue("", known.attribute()) : null;
        if (value != null && !known.words().contains(value)) {
            throw new Refusal(
                    "unknown " + known.noun() + " '" + value + "'", Spelling.hint(value, known.words()), locator);
        }
    }
}
