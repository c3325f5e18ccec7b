package bedmark.office;

import static org.junit.jupiter.api.Assertions.assertEquals;
import static org.junit.jupiter.api.Assertions.assertInstanceOf;
import static org.junit.jupiter.api.Assertions.assertTrue;

import bedmark.document.Branch;
import bedmark.document.Node;
import bedmark.journal.Progress;
import bedmark.survey.Bundle;
import java.nio.file.Path;
import java.util.List;

/** Ids at and beyond what every database holds, as packs bring them to an office. */
final class IdBounds {
    /** Three bytes in a database's text: the longest key that such ids make is the one to fit. */
    private static final String WIDE = "坑";

    private final OfficeStore store;
    private final Path tablet;
    private final Path folder;

    /** @param tablet whose key the office trusts */
    IdBounds(OfficeStore store, Path tablet, Path folder) {
        this.store = store;
        this.tablet = tablet;
        this.folder = folder;
    }

    /** Refused beyond the bounds, each in one sentence of ours and with nothing taken in; taken in up to them. */
    void prove() {
        int before = store.packs().size();
        for (String kind : List.of("plant", "transfer", "round")) {
            assertEquals("id-too-long", refusal(kind, "r".repeat(Ids.LONGEST + 1)), kind);
            assertEquals("id-too-long", refusal(kind, WIDE.repeat(Ids.LONGEST + 1)), kind);
            assertEquals("id-control-character", refusal(kind, "r\0"), kind);
            assertEquals("id-control-character", refusal(kind, "r\u0085"), kind);
        }
        assertEquals(before, store.packs().size());
        String longest = WIDE.repeat(Ids.LONGEST);
        assertInstanceOf(Received.Taken.class, received(longest, longest, longest));
        assertTrue(store.registers().containsKey(longest));
        assertEquals(1, store.zonesNamed(longest).size());
    }

    private String refusal(String kind, String id) {
        Received received = received(kind.equals("plant") ? id : "works", kind.equals("transfer") ? id : "TP",
                kind.equals("round") ? id : "2026");
        return assertInstanceOf(Received.Turned.class, received).why().code();
    }

    private Received received(String plant, String transfer, String round) {
        Branch document = Offices.sample("round-2026-03").document();
        Branch survey = document.branches("surveys").get(0);
        Branch register = document.branch("plant").orElseThrow();
        List<Node> transfers = register.branches("transfers").stream()
                .map(row -> (Node) (row.text("id").equals(survey.text("transfer")) ? row.with("id", transfer) : row))
                .toList();
        Branch walked = Branch.EMPTY.with("id", round).with("points", new Node.Series(List.of()));
        Bundle bundle = new Bundle(document.with("plant", register.with("id", plant).with("transfers",
                        new Node.Series(transfers))).with("rounds", new Node.Series(List.of(walked)))
                .with("surveys", new Node.Series(List.of(survey.with("transfer", transfer).with("round", round)))));
        Path pack = Offices.pack(bundle, tablet, folder.resolve("bounds.zip"));
        return store.receive(List.of(pack), "Ida Marsh", Progress.NONE).get(0);
    }
}
