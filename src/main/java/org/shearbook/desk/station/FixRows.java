package org.shearbook.desk.station;

import java.sql.ResultSet;
import java.sql.SQLException;
import java.sql.Types;
import java.time.Instant;
import java.time.OffsetDateTime;
import java.time.ZoneOffset;
import java.util.ArrayList;
import java.util.List;
import org.springframework.jdbc.core.JdbcTemplate;
import org.springframework.stereotype.Repository;

/** The rows of the lists of fixes, by plain SQL: eighty thousand of them need no entity each. */
@Repository
class FixRows {

    private static final int BATCH = 1000;
    private static final String COLUMNS = "f.identifier, f.kind, f.name, f.latitude_deg, f.longitude_deg, f.elevation_m, f.magnetic_variation_east_deg";
    private static final String IN_FORCE = """
             from fix f join fix_list_version l on l.row_id = f.list_row_id
             where l.version = (select max(n.version) from fix_list_version n where n.list_name = l.list_name and n.recorded_at <= ?)""";

    private final JdbcTemplate jdbc;

    FixRows(JdbcTemplate jdbc) {
        this.jdbc = jdbc;
    }

    void add(long listRowId, List<Fix> fixes) {
        for (int from = 0; from < fixes.size(); from += BATCH) {
            List<Object[]> rows = new ArrayList<>(BATCH);
            for (int i = from; i < Math.min(from + BATCH, fixes.size()); i++) {
                Fix fix = fixes.get(i);
                rows.add(new Object[] {listRowId, i + 1, fix.identifier(), fix.kind(), fix.name(), fix.latitude(), fix.longitude(),
                    Double.isNaN(fix.elevation()) ? null : fix.elevation(),
                    Double.isNaN(fix.magneticVariationEast()) ? null : fix.magneticVariationEast()});
            }
            jdbc.batchUpdate("""
                    insert into fix (list_row_id, row_number_in_list, identifier, kind, name, latitude_deg, longitude_deg, elevation_m,
                      magnetic_variation_east_deg) values (?, ?, ?, ?, ?, ?, ?, ?, ?)""", rows,
                    new int[] {Types.BIGINT, Types.INTEGER, Types.VARCHAR, Types.VARCHAR, Types.VARCHAR, Types.DOUBLE, Types.DOUBLE, Types.DOUBLE, Types.DOUBLE});
        }
    }

    List<Fix> all(Instant moment) {
        return jdbc.query("select " + COLUMNS + " " + IN_FORCE, FixRows::fix, at(moment));
    }

    List<Fix> named(String identifier, Instant moment) {
        return jdbc.query("select " + COLUMNS + " " + IN_FORCE + " and f.identifier = ? order by f.kind, f.name", FixRows::fix, at(moment), identifier);
    }

    List<Fix> page(Instant moment, int after, int limit) {
        return jdbc.query("select " + COLUMNS + " " + IN_FORCE + " order by f.identifier, f.kind, f.name, f.row_number_in_list, l.list_name limit ? offset ?",
                FixRows::fix, at(moment), limit, after);
    }

    /** Changes whenever a station or a list of fixes is kept. */
    String edition() {
        return jdbc.queryForObject("""
                select concat((select count(*) from station_version), '/', (select max(recorded_at) from station_version), '/',
                  (select count(*) from fix_list_version), '/', (select max(recorded_at) from fix_list_version))""", String.class);
    }

    private static OffsetDateTime at(Instant moment) {
        return moment.atOffset(ZoneOffset.UTC);
    }

    private static Fix fix(ResultSet row, int number) throws SQLException {
        return new Fix(row.getString(1), row.getString(2), row.getString(3), row.getDouble(4), row.getDouble(5), orUnknown(row, 6), orUnknown(row, 7));
    }

    private static double orUnknown(ResultSet row, int column) throws SQLException {
        double found = row.getDouble(column);
        return row.wasNull() ? Double.NaN : found;
    }
}
