package bedmark.index;

import bedmark.document.Branch;
import bedmark.survey.QueueState;
import bedmark.survey.SurveyHistory;
import java.nio.file.Path;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.util.ArrayList;
import java.util.HexFormat;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import java.util.TreeMap;
import java.util.UUID;

/** The answers of a store to every question, for comparing two stores. */
record Asked(List<SurveyLine> lines, List<SurveyLine> current, Map<QueueState, Long> counts, List<SurveyLine> queue,
             List<Walk> walks, List<Export> exports, Optional<Branch> register,
             Map<UUID, Optional<SurveyHistory>> histories, Map<UUID, Optional<Branch>> before) {

    static final List<String> TABLES = List.of("settings", "mark", "entry", "touch", "landmark", "walk", "survey");

    static Asked of(Store store) {
        List<SurveyLine> lines = store.surveys(SurveyQuery.ALL);
        Map<UUID, Optional<SurveyHistory>> histories = new TreeMap<>();
        Map<UUID, Optional<Branch>> before = new TreeMap<>();
        for (SurveyLine line : lines) {
            histories.put(line.id(), store.history(line.id()));
            before.put(line.id(), store.latestFinished(line.transfer(), Optional.of(line.id())));
        }
        return new Asked(lines, store.surveys(SurveyQuery.ALL.current()), store.counts(), store.queue(),
                store.walks(), store.exports(), store.register(), histories, before);
    }

    /** Every row of every table of a closed store. */
    static List<String> tables(Path store) {
        List<String> rows = new ArrayList<>();
        try (Database database = Database.openToRead(store.resolve(Ledger.INDEX))) {
            TABLES.forEach(table -> rows.addAll(database.rows("select * from " + table + " order by 1, 2",
                    row -> text(table, row))));
        }
        return rows;
    }

    static String text(String table, ResultSet row) throws SQLException {
        StringBuilder text = new StringBuilder(table);
        for (int i = 1; i <= row.getMetaData().getColumnCount(); i++) {
            Object value = row.getObject(i);
            text.append(' ').append(value instanceof byte[] bytes ? HexFormat.of().formatHex(bytes) : value);
        }
        return text.toString();
    }
}
