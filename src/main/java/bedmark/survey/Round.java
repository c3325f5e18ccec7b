package bedmark.survey;

import bedmark.document.Branch;
import bedmark.document.Defect;
import bedmark.document.Pointer;
import bedmark.document.Refused;
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

    public List<Point> points() {
        return document.branches("points").stream().map(Point::new).toList();
    }
}
