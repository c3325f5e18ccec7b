package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Node;
import bedmark.document.Pointer;
import bedmark.document.Refused;
import java.time.DateTimeException;
import java.time.LocalDate;
import java.util.List;
import java.util.Optional;

/** A round: transfer points in walking order. */
public record Round(Branch document) {
    public Round {
        if (!document.has("id")) {
            throw new Refused(Defect.at(Pointer.ROOT, "key-absent", "id"));
        }
    }

    /** One stop of the round. */
    public record Point(Branch document) {
        public String transfer() {
            return document.text("transfer")
                    .orElseThrow(() -> new Refused(Defect.at(Pointer.ROOT, "key-absent", "transfer")));
        }

        public Optional<String> status() {
            return document.text("status");
        }

        /** The last day for this point, where it is another than the round's. */
        public Optional<LocalDate> dueBy() {
            return day(document);
        }

        public Optional<String> reason() {
            return document.text("reason");
        }
    }

    public String id() {
        return document.text("id").orElseThrow();
    }

    public String name() {
        return document.text("name").orElse(id());
    }

    /** The last day on which the round may be walked. */
    public Optional<LocalDate> dueBy() {
        return day(document);
    }

    /** A day that can't be read is as good as none: it must not keep anyone from walking. */
    private static Optional<LocalDate> day(Branch document) {
        try {
            return document.get("dueBy").filter(Node.Text.class::isInstance)
                    .map(node -> LocalDate.parse(((Node.Text) node).value()));
        } catch (DateTimeException e) {
            return Optional.empty();
        }
    }

    public List<Point> points() {
        return document.branches("points").stream().map(Point::new).toList();
    }
}
