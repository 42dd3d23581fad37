using Microsoft.EntityFrameworkCore.Migrations;

#nullable disable

namespace TankChem.Migrations.Sqlite.Migrations
{
    /// <inheritdoc />
    public partial class Rollups : Migration
    {
        /// <inheritdoc />
        protected override void Up(MigrationBuilder migrationBuilder)
        {
            // WITHOUT ROWID, as the series themselves. What an older store holds is rolled up here once.
            migrationBuilder.Sql("""
                CREATE TABLE reading_rollup (
                    series_id INTEGER NOT NULL,
                    step_h INTEGER NOT NULL,
                    start_h INTEGER NOT NULL,
                    lowest REAL NOT NULL,
                    highest REAL NOT NULL,
                    total REAL NOT NULL,
                    counted INTEGER NOT NULL,
                    CONSTRAINT PK_reading_rollup PRIMARY KEY (series_id, step_h, start_h)
                ) WITHOUT ROWID;
                """);
            migrationBuilder.Sql("""
                INSERT INTO reading_rollup (series_id, step_h, start_h, lowest, highest, total, counted)
                SELECT series_id, 1, (time_ms - ((time_ms % 3600000) + 3600000) % 3600000) / 3600000 AS hour, min(value), max(value), sum(value), count(*)
                FROM reading WHERE flag = 1 AND value IS NOT NULL GROUP BY series_id, hour;
                """);
            migrationBuilder.Sql("""
                INSERT INTO reading_rollup (series_id, step_h, start_h, lowest, highest, total, counted)
                SELECT series_id, 24, start_h - ((start_h % 24) + 24) % 24 AS day, min(lowest), max(highest), sum(total), sum(counted)
                FROM reading_rollup WHERE step_h = 1 GROUP BY series_id, day;
                """);

            migrationBuilder.Sql("""
                CREATE TABLE state_rollup (
                    state_series_id INTEGER NOT NULL,
                    step_h INTEGER NOT NULL,
                    start_h INTEGER NOT NULL,
                    lowest REAL NOT NULL,
                    highest REAL NOT NULL,
                    total REAL NOT NULL,
                    counted INTEGER NOT NULL,
                    CONSTRAINT PK_state_rollup PRIMARY KEY (state_series_id, step_h, start_h)
                ) WITHOUT ROWID;
                """);
            migrationBuilder.Sql("""
                INSERT INTO state_rollup (state_series_id, step_h, start_h, lowest, highest, total, counted)
                SELECT state_series_id, 1, (time_ms - ((time_ms % 3600000) + 3600000) % 3600000) / 3600000 AS hour, min(value), max(value), sum(value), count(*)
                FROM state_value WHERE value IS NOT NULL GROUP BY state_series_id, hour;
                """);
            migrationBuilder.Sql("""
                INSERT INTO state_rollup (state_series_id, step_h, start_h, lowest, highest, total, counted)
                SELECT state_series_id, 24, start_h - ((start_h % 24) + 24) % 24 AS day, min(lowest), max(highest), sum(total), sum(counted)
                FROM state_rollup WHERE step_h = 1 GROUP BY state_series_id, day;
                """);
        }

        /// <inheritdoc />
        protected override void Down(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.DropTable(
                name: "reading_rollup");

            migrationBuilder.DropTable(
                name: "state_rollup");
        }
    }
}
