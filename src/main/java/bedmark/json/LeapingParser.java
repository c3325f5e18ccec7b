package bedmark.json;

import com.fasterxml.jackson.core.JsonFactory;
import com.fasterxml.jackson.core.JsonFactoryBuilder;
import com.fasterxml.jackson.core.JsonParser;
import com.fasterxml.jackson.core.JsonToken;
import com.fasterxml.jackson.core.io.IOContext;
import com.fasterxml.jackson.core.json.UTF8StreamJsonParser;
import com.fasterxml.jackson.core.sym.ByteQuadsCanonicalizer;

/**
 * The library's parser, which can leap over what needs no reading. It is given whole arrays of bytes that are known to be
 * UTF-8, and looks for no other encoding.
 */
final class LeapingParser extends UTF8StreamJsonParser {

    /** Made for the first leap: most texts are short, and nothing in them is leapt over. */
    private QuickPass pass;

    private LeapingParser(Factory factory, IOContext context, byte[] bytes, int from, int to) {
        super(context, factory.features(), null, null, factory.names(), bytes, from, to, 0, false);
    }

    /** Makes such parsers where it is given bytes. */
    static final class Factory extends JsonFactory {
        private static final long serialVersionUID = 1;

        Factory(JsonFactoryBuilder settings) {
            super(settings);
        }

        @Override
        protected JsonParser _createParser(byte[] bytes, int from, int length, IOContext context) {
            return new LeapingParser(this, context, bytes, from, from + length);
        }

        private int features() {
            return _parserFeatures;
        }

        private ByteQuadsCanonicalizer names() {
            return _byteSymbolCanonicalizer.makeChildOrPlaceholder(_factoryFeatures);
        }
    }

    /**
     * Leaps to the end of the object that begins with the token that was read last; that is the next token then.
     *
     * @return false where it has to be read, since it is not strict beyond doubt
     */
    boolean leaps() {
        if (_currToken != JsonToken.START_OBJECT) {
            return false;
        }
        if (pass == null) {
            pass = new QuickPass(_inputBuffer);
        }
        int deepest = streamReadConstraints().getMaxNestingDepth() - getParsingContext().getNestingDepth() + 1;
        int end = pass.end(_inputPtr, deepest);
        if (end < 0) {
            return false;
        }
        _inputPtr = end;
        return true;
    }
}
