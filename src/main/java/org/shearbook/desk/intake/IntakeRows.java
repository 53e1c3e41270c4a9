package org.shearbook.desk.intake;

import java.nio.charset.StandardCharsets;
import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.Collection;
import java.util.HashMap;
import java.util.List;
import java.util.Map;
import java.util.Optional;
import org.jspecify.annotations.Nullable;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.stereotype.Repository;

/** The tables of the intake, by plain SQL: a batch has thousands of rows and none of them is ever changed. */
@Repository
class IntakeRows {

    private static final int BATCH = 1000;
    private static final int RAW_SHOWN = 20_000;

    private static final String ITEMS = """
            select i.item_id, i.version, i.batch_id, i.arrival_number, a.arrival_name, i.line_number, i.column_number, i.reason_code, i.state, i.settled_by,
              i.settled_reason, t.what_to_do, t.raw, i.received_at, i.recorded_at
            from intake_item_version i join intake_arrival a on a.batch_id = i.batch_id and a.arrival_number = i.arrival_number
              left join intake_item_text t on t.item_id = i.item_id
            where i.version = (select max(n.version) from intake_item_version n where n.item_id = i.item_id and n.recorded_at <= ?)""" + " ";

    private static final String BATCHES = """
            select batch_id, channel, actor, arrival_count, accepted_count, duplicate_count, queued_count, refused_count, content_digest, received_at, recorded_at
            from intake_batch""" + " ";

    private final JdbcTemplate jdbc;

    IntakeRows(JdbcTemplate jdbc) {
        this.jdbc = jdbc;
    }

    /** What a fingerprint stands for. */
    record Known(long recordId, int version) {
    }

    long draw(String sequence) {
        return jdbc.queryForObject("select nextval('" + sequence + "')", Long.class);
    }

    Map<String, Known> known(Collection<String> fingerprints) {
        Map<String, Known> known = new HashMap<>();
        List<String> asked = List.copyOf(fingerprints);
        for (int from = 0; from < asked.size(); from += BATCH) {
            List<String> some = asked.subList(from, Math.min(from + BATCH, asked.size()));
            String marks = "?,".repeat(some.size() - 1) + "?";
            jdbc.query("select fingerprint, record_id, record_version from intake_fingerprint where fingerprint in (" + marks + ")",
                    row -> {
                        known.put(row.getString(1), new Known(row.getLong(2), row.getInt(3)));
                    }, some.toArray());
        }
        return known;
    }

    void addFingerprints(String kind, Map<String, Known> fingerprints, long batchId) {
        insert("insert into intake_fingerprint (fingerprint, record_kind, record_id, record_version, batch_id) values (?, ?, ?, ?, ?)",
                fingerprints.entrySet().stream().map(one -> new Object[] {one.getKey(), kind, one.getValue().recordId(), one.getValue().version(), batchId}).toList(),
                Types.VARCHAR, Types.VARCHAR, Types.BIGINT, Types.INTEGER, Types.BIGINT);
    }

    void addBatch(Batch batch) {
        jdbc.update("""
                insert into intake_batch (batch_id, channel, actor, arrival_count, accepted_count, duplicate_count, queued_count, refused_count, content_digest,
                  observed_at, received_at, recorded_at) values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)""",
                batch.id(), batch.channel(), batch.actor(), batch.arrivals(), batch.accepted(), batch.duplicates(), batch.queued(), batch.refused(), batch.digest(),
                at(batch.receivedAt()), at(batch.receivedAt()), at(batch.recordedAt()));
    }

    void addArrival(long batchId, Batch.Part part, String saltedDigest) {
        jdbc.update("""
                insert into intake_arrival (batch_id, arrival_number, arrival_name, byte_count, source_format, accepted_count, queued_count, refused_code,
                  refused_text, salted_digest) values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?)""",
                batchId, part.number(), part.name(), part.bytes(), part.format(), part.accepted(), part.queued(), part.refusedCode(), part.refusedText(), saltedDigest);
    }

    void addRaw(long batchId, int arrival, byte[] salt, byte[] bytes) {
        jdbc.update("insert into intake_raw (batch_id, arrival_number, salt, bytes) values (?, ?, ?, ?)", batchId, arrival, salt, bytes);
    }

    void addRecords(long batchId, List<Accepted> accepted) {
        List<Object[]> rows = new ArrayList<>(accepted.size());
        for (Accepted one : accepted) {
            rows.add(new Object[] {batchId, rows.size() + 1, one.arrival(), one.line(), one.kind(), one.id(), one.version(), one.duplicate(), one.remarks().size()});
        }
        insert("""
                insert into intake_record (batch_id, record_number, arrival_number, line_number, record_kind, record_id, record_version, duplicate, remark_count)
                values (?, ?, ?, ?, ?, ?, ?, ?, ?)""", rows,
                Types.BIGINT, Types.INTEGER, Types.INTEGER, Types.INTEGER, Types.VARCHAR, Types.BIGINT, Types.INTEGER, Types.BOOLEAN, Types.INTEGER);
    }

    /** @param raws null where the whole arrival is meant */
    void addItems(long batchId, List<Queued> items, List<byte @Nullable []> raws, Instant receivedAt, Instant recordedAt) {
        List<Object[]> versions = new ArrayList<>(items.size());
        List<Object[]> texts = new ArrayList<>(items.size());
        for (int k = 0; k < items.size(); k++) {
            Queued item = items.get(k);
            versions.add(new Object[] {item.id(), 1, batchId, item.arrival(), item.line(), item.column(), item.code(), ItemState.OPEN.name(), null, null,
                at(receivedAt), at(receivedAt), at(recordedAt)});
            texts.add(new Object[] {item.id(), batchId, item.text(), raws.get(k)});
        }
        insert(ITEM_INSERT, versions, ITEM_TYPES);
        insert("insert into intake_item_text (item_id, batch_id, what_to_do, raw) values (?, ?, ?, ?)", texts, Types.BIGINT, Types.BIGINT, Types.VARCHAR, Types.BINARY);
    }

    private static final String ITEM_INSERT = """
            insert into intake_item_version (item_id, version, batch_id, arrival_number, line_number, column_number, reason_code, state, settled_by,
              settled_reason, observed_at, received_at, recorded_at) values (?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?, ?)""";
    private static final int[] ITEM_TYPES = {Types.BIGINT, Types.INTEGER, Types.BIGINT, Types.INTEGER, Types.INTEGER, Types.INTEGER, Types.VARCHAR, Types.VARCHAR,
        Types.VARCHAR, Types.VARCHAR, Types.TIMESTAMP_WITH_TIMEZONE, Types.TIMESTAMP_WITH_TIMEZONE, Types.TIMESTAMP_WITH_TIMEZONE};

    void addVersion(QueueItem before, ItemState state, String by, String reason, Instant recordedAt) {
        insert(ITEM_INSERT, List.<Object[]>of(new Object[] {before.id(), before.version() + 1, before.batchId(), before.arrival(), before.line(), before.column(),
            before.code(), state.name(), by, reason, at(recordedAt), at(before.receivedAt()), at(recordedAt)}), ITEM_TYPES);
    }

    private void insert(String sql, List<Object[]> rows, int... types) {
        for (int from = 0; from < rows.size(); from += BATCH) {
            jdbc.batchUpdate(sql, rows.subList(from, Math.min(from + BATCH, rows.size())), types);
        }
    }

    List<QueueItem> open(Instant moment, int limit) {
        return jdbc.query(ITEMS + "and i.state = 'OPEN' order by i.item_id desc limit ?", IntakeRows::item, at(moment), limit);
    }

    int openCount(Instant moment) {
        return jdbc.queryForObject("""
                select count(*) from intake_item_version i where i.state = 'OPEN'
                  and i.version = (select max(n.version) from intake_item_version n where n.item_id = i.item_id and n.recorded_at <= ?)""", Integer.class, at(moment));
    }

    Optional<QueueItem> item(long id, Instant moment) {
        return jdbc.query(ITEMS + "and i.item_id = ?", IntakeRows::item, at(moment), id).stream().findFirst();
    }

    List<QueueItem> itemsOf(long batchId, Instant moment, int limit) {
        return jdbc.query(ITEMS + "and i.batch_id = ? order by i.item_id limit ?", IntakeRows::item, at(moment), batchId, limit);
    }

    List<Batch> newest(Instant moment, long before, int limit) {
        return jdbc.query(BATCHES + "where recorded_at <= ? and batch_id < ? order by batch_id desc limit ?", IntakeRows::batch, at(moment), before, limit);
    }

    Optional<Batch> batch(long id) {
        return jdbc.query(BATCHES + "where batch_id = ?", IntakeRows::batch, id).stream().findFirst();
    }

    List<Batch.Part> parts(long batchId) {
        return jdbc.query("""
                select arrival_number, arrival_name, byte_count, source_format, accepted_count, queued_count, refused_code, refused_text
                from intake_arrival where batch_id = ? order by arrival_number""",
                (row, number) -> new Batch.Part(row.getInt(1), row.getString(2), row.getLong(3), row.getString(4), row.getInt(5), row.getInt(6), row.getString(7),
                        row.getString(8)), batchId);
    }

    List<Batch.Line> records(long batchId, int limit) {
        return jdbc.query("""
                select record_kind, record_id, record_version, duplicate, arrival_number, line_number, remark_count
                from intake_record where batch_id = ? order by record_number limit ?""",
                (row, number) -> new Batch.Line(row.getString(1), row.getLong(2), row.getInt(3), row.getBoolean(4), row.getInt(5), row.getInt(6), row.getInt(7)),
                batchId, limit);
    }

    /** The bytes of an arrival; empty once they were disposed of. */
    Optional<byte[]> raw(long batchId, int arrival) {
        return jdbc.query("select bytes from intake_raw where batch_id = ? and arrival_number = ?", (row, number) -> row.getBytes(1), batchId, arrival).stream().findFirst();
    }

    private static OffsetDateTime at(Instant moment) {
        return moment.atOffset(ZoneOffset.UTC);
    }

    private static Instant instant(ResultSet row, int column) throws SQLException {
        return row.getObject(column, OffsetDateTime.class).toInstant();
    }

    private static QueueItem item(ResultSet row, int number) throws SQLException {
        byte[] raw = row.getBytes(13);
        return new QueueItem(row.getLong(1), row.getInt(2), row.getLong(3), row.getInt(4), row.getString(5), row.getInt(6), row.getInt(7), row.getString(8),
                ItemState.valueOf(row.getString(9)), row.getString(10), row.getString(11), row.getString(12), raw == null ? null : shown(raw), instant(row, 14), instant(row, 15));
    }

    static String shown(byte[] raw) {
        return new String(raw, 0, Math.min(raw.length, RAW_SHOWN), StandardCharsets.UTF_8);
    }

    private static Batch batch(ResultSet row, int number) throws SQLException {
        return new Batch(row.getLong(1), row.getString(2), row.getString(3), row.getInt(4), row.getInt(5), row.getInt(6), row.getInt(7), row.getInt(8), row.getString(9),
                instant(row, 10), instant(row, 11));
    }
}
