package bedmark.office;

import bedmark.document.Refused;
import bedmark.engine.verdict.Rule;
import bedmark.index.office.DeedRow;
import bedmark.index.office.OfficeTables;
import bedmark.json.EntryCodec;
import bedmark.survey.Act;
import bedmark.survey.Entry;
import bedmark.survey.OfficeDeed;
import bedmark.survey.merge.ZoneId;
import java.util.ArrayList;
import java.util.Collection;
import java.util.EnumMap;
import java.util.HashMap;
import java.util.HashSet;
import java.util.LinkedHashMap;
import java.util.List;
import java.util.Map;
import java.util.Set;
import java.util.UUID;

/** What the office's deeds come to: whom it trusts, what it answered and decided, what is to be done. */
final class Minutes {
    private static final List<String> CODES = List.of("pack-received", "device-trusted", "finding-answered",
            "finding-reopened", "clash-settled", "action-set", "round-sent");

    private final Map<String, String> trusted = new HashMap<>();
    private final Map<ZoneId, Map<Rule, Answered>> answers = new HashMap<>();
    private final Set<String> setAside = new HashSet<>();
    private final Map<UUID, OfficeDeed.ActionSet> actions = new LinkedHashMap<>();
    private final List<Entry> packs = new ArrayList<>();
    private long read;

    /** Reads what was done since it last read. */
    void readOn(OfficeTables tables) {
        for (DeedRow row : tables.deeds(CODES, read)) {
            read = row.sequence();
            try {
                Entry entry = EntryCodec.read(row.payload());
                if (entry.act() instanceof Act.OfficeActed acted) {
                    take(entry, acted.deed());
                }
            } catch (Refused e) {
                // Of a later program: this one does without it, and the journal keeps it.
                continue;
            }
        }
    }

    private void take(Entry entry, OfficeDeed deed) {
        if (deed instanceof OfficeDeed.PackReceived) {
            packs.add(entry);
        } else if (deed instanceof OfficeDeed.DeviceTrusted device) {
            trusted.put(device.fingerprint(), device.name());
        } else if (deed instanceof OfficeDeed.FindingAnswered answered) {
            Rule.ofCode(answered.finding()).ifPresent(rule -> answers
                    .computeIfAbsent(answered.zone(), key -> new EnumMap<>(Rule.class))
                    .put(rule, new Answered(rule, answered.answer(), answered.reason(), entry.person(), entry.at(),
                            answered.until(), FindingLine.of(rule, answered.before()))));
        } else if (deed instanceof OfficeDeed.FindingReopened reopened) {
            Rule.ofCode(reopened.finding()).ifPresent(rule ->
                    answers.getOrDefault(reopened.zone(), new EnumMap<>(Rule.class)).remove(rule));
        } else if (deed instanceof OfficeDeed.ClashSettled settled) {
            setAside.addAll(settled.setAside());
        } else if (deed instanceof OfficeDeed.ActionSet action) {
            actions.put(action.action(), action);
        }
    }

    boolean trusts(String fingerprint) {
        return trusted.containsKey(fingerprint);
    }

    Collection<Answered> answers(ZoneId zone) {
        return answers.getOrDefault(zone, Map.of()).values();
    }

    /** Digests of contents that a person decided against. */
    Set<String> setAside() {
        return Set.copyOf(setAside);
    }

    List<OfficeDeed.ActionSet> actions() {
        return List.copyOf(actions.values());
    }

    /** The packs that were taken in, in their order. */
    List<Entry> packs() {
        return List.copyOf(packs);
    }
}
