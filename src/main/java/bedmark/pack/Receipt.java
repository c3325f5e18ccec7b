package bedmark.pack;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import bedmark.json.ReceiptText;
import bedmark.survey.Survey;
import java.math.BigDecimal;
import java.time.OffsetDateTime;
import java.util.ArrayList;
import java.util.List;
import java.util.UUID;

/**
 * What an office confirms of one pack: it has these surveys, with this content. A typed view over the document, which
 * keeps every key that this version does not know.
 */
public record Receipt(Branch document) {

    /** Who confirms: the identity of the office's store. */
    public record Office(UUID id, String name) {
    }

    /**
     * One survey that was received.
     *
     * @param sha256 of its content, see {@link SurveyContent}
     */
    public record Item(UUID survey, int revision, String sha256) {
        public static Item of(Survey survey) {
            return new Item(survey.id(), survey.revision(), SurveyContent.sha256(survey));
        }

        private Branch document() {
            return Branch.EMPTY.with("id", survey.toString()).with("revision", Node.number(revision))
                    .with("sha256", sha256);
        }
    }

    public Receipt {
        for (String key : List.of("id", "receivedAt", "office", "pack", "surveys")) {
            if (!document.has(key)) {
                throw new Refused(Defect.at(Pointer.ROOT, "key-absent", key));
            }
        }
    }

    /**
     * Makes a receipt.
     *
     * @param pack       the bundle's id
     * @param packSha256 digest of the pack's file, hexadecimal
     * @param items      what the office has of it now; a survey that it refused is not among them
     */
    public static Receipt of(UUID id, OffsetDateTime receivedAt, Office office, UUID pack, String packSha256,
                             List<Item> items) {
        List<Node> surveys = new ArrayList<>();
        items.forEach(item -> surveys.add(item.document()));
        return new Receipt(Branch.EMPTY
                .with("format", ReceiptText.FORMAT)
                .with("version", Node.number(ReceiptText.VERSION))
                .with("id", id.toString())
                .with("receivedAt", Node.time(receivedAt))
                .with("office", Branch.EMPTY.with("id", office.id().toString()).with("name", office.name()))
                .with("pack", Branch.EMPTY.with("id", pack.toString()).with("sha256", packSha256))
                .with("surveys", new Node.Series(surveys)));
    }

    public UUID id() {
        return document.uuid("id").orElseThrow();
    }

    public OffsetDateTime receivedAt() {
        return document.time("receivedAt").orElseThrow();
    }

    public Office office() {
        Branch office = document.branch("office").orElseThrow();
        return new Office(office.uuid("id").orElseThrow(), office.text("name").orElse(""));
    }

    /** The id of the bundle in the pack. */
    public UUID pack() {
        return document.branch("pack").flatMap(pack -> pack.uuid("id")).orElseThrow();
    }

    /** The digest of the pack's file, hexadecimal. */
    public String packSha256() {
        return document.branch("pack").flatMap(pack -> pack.text("sha256")).orElseThrow();
    }

    public List<Item> items() {
        return document.branches("surveys").stream().map(item -> new Item(item.uuid("id").orElseThrow(),
                item.number("revision").map(BigDecimal::intValueExact).orElseThrow(),
                item.text("sha256").orElseThrow())).toList();
    }
}
