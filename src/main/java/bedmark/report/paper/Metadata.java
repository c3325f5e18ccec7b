package bedmark.report.paper;

import java.io.ByteArrayInputStream;
import java.io.IOException;
import java.nio.charset.StandardCharsets;
import java.time.format.DateTimeFormatter;
import org.apache.pdfbox.cos.COSDictionary;
import org.apache.pdfbox.cos.COSName;
import org.apache.pdfbox.pdmodel.PDDocument;
import org.apache.pdfbox.pdmodel.common.PDStream;

/** What a document says of itself in XMP (ISO 16684-1): title, language, when it was made, that it is accessible. */
final class Metadata {
    private static final String PACKET = """
            <?xpacket begin="\uFEFF" id="W5M0MpCehiHzreSzNTczkc9d"?>
            <x:xmpmeta xmlns:x="adobe:ns:meta/">
            <rdf:RDF xmlns:rdf="http://www.w3.org/1999/02/22-rdf-syntax-ns#">
            <rdf:Description rdf:about="" xmlns:dc="http://purl.org/dc/elements/1.1/"
             xmlns:xmp="http://ns.adobe.com/xap/1.0/" xmlns:pdf="http://ns.adobe.com/pdf/1.3/"
             xmlns:pdfuaid="http://www.aiim.org/pdfua/ns/id/">
            <dc:title><rdf:Alt><rdf:li xml:lang="x-default">%s</rdf:li></rdf:Alt></dc:title>
            <dc:language><rdf:Bag><rdf:li>%s</rdf:li></rdf:Bag></dc:language>
            <xmp:CreateDate>%s</xmp:CreateDate>
            <pdf:Producer>%s</pdf:Producer>
            <pdfuaid:part>1</pdfuaid:part>
            </rdf:Description>
            </rdf:RDF>
            </x:xmpmeta>
            <?xpacket end="w"?>
            """;
    private static final DateTimeFormatter SECOND = DateTimeFormatter.ofPattern("yyyy-MM-dd'T'HH:mm:ssxxx");

    private Metadata() {
    }

    static COSDictionary stream(PDDocument document, Booklet.Imprint imprint) throws IOException {
        String packet = PACKET.formatted(escaped(imprint.title()), escaped(imprint.language().toLanguageTag()),
                SECOND.format(imprint.madeAt()), escaped(imprint.producer()));
        COSDictionary stream = new PDStream(document,
                new ByteArrayInputStream(packet.getBytes(StandardCharsets.UTF_8))).getCOSObject();
        stream.setName(COSName.TYPE, "Metadata");
        stream.setName(COSName.SUBTYPE, "XML");
        return stream;
    }

    /** A name from elsewhere stays text: marks are escaped, what no XML may hold becomes a space. */
    private static String escaped(String text) {
        return text.replaceAll("[\\p{Cntrl}\\uD800-\\uDFFF\\uFFFE\\uFFFF]", " ").replace("&", "&amp;")
                .replace("<", "&lt;").replace(">", "&gt;");
    }
}
