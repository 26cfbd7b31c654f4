package org.solewright.formats.c3d;

import java.nio.ByteBuffer;
import java.nio.charset.CharacterCodingException;
import java.nio.charset.Charset;
import java.nio.charset.CodingErrorAction;
import java.nio.charset.StandardCharsets;

/** Text in C3D files: the format says ASCII, files hold UTF-8 or Windows-1252. */
final class Text {

    private static final Charset WINDOWS = Charset.forName("windows-1252");

    private Text() {}

    static String decode(byte[] bytes, int offset, int count) {
        try {
            return StandardCharsets.UTF_8
                    .newDecoder()
                    .onMalformedInput(CodingErrorAction.REPORT)
                    .onUnmappableCharacter(CodingErrorAction.REPORT)
                    .decode(ByteBuffer.wrap(bytes, offset, count))
                    .toString();
        } catch (CharacterCodingException e) {
            return new String(bytes, offset, count, WINDOWS);
        }
    }
}
