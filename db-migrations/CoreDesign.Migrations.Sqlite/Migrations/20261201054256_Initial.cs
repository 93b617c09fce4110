using System;
using Microsoft.EntityFrameworkCore.Migrations;

#nullable disable

namespace CoreDesign.Migrations.Sqlite.Migrations
{
    /// <inheritdoc />
    public partial class Initial : Migration
    {
        /// <inheritdoc />
        protected override void Up(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.CreateTable(
                name: "Designs",
                columns: table => new
                {
                    Id = table.Column<long>(type: "INTEGER", nullable: false)
                        .Annotation("Sqlite:Autoincrement", true),
                    CreatedAt = table.Column<long>(type: "INTEGER", nullable: false),
                    CurrentRevision = table.Column<int>(type: "INTEGER", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("PK_Designs", x => x.Id);
                });

            migrationBuilder.CreateTable(
                name: "Drafts",
                columns: table => new
                {
                    Key = table.Column<Guid>(type: "TEXT", nullable: false),
                    DesignId = table.Column<long>(type: "INTEGER", nullable: true),
                    BaseRevision = table.Column<int>(type: "INTEGER", nullable: true),
                    Payload = table.Column<string>(type: "TEXT", nullable: false),
                    UpdatedAt = table.Column<long>(type: "INTEGER", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("PK_Drafts", x => x.Key);
                });

            migrationBuilder.CreateTable(
                name: "Steels",
                columns: table => new
                {
                    Id = table.Column<long>(type: "INTEGER", nullable: false)
                        .Annotation("Sqlite:Autoincrement", true),
                    Name = table.Column<string>(type: "TEXT", nullable: false),
                    NameKey = table.Column<string>(type: "TEXT", nullable: false),
                    Payload = table.Column<string>(type: "TEXT", nullable: false),
                    Fingerprint = table.Column<string>(type: "TEXT", nullable: false),
                    ImportedAt = table.Column<long>(type: "INTEGER", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("PK_Steels", x => x.Id);
                });

            migrationBuilder.CreateTable(
                name: "Revisions",
                columns: table => new
                {
                    Id = table.Column<long>(type: "INTEGER", nullable: false)
                        .Annotation("Sqlite:Autoincrement", true),
                    DesignId = table.Column<long>(type: "INTEGER", nullable: false),
                    Number = table.Column<int>(type: "INTEGER", nullable: false),
                    CreatedAt = table.Column<long>(type: "INTEGER", nullable: false),
                    Author = table.Column<string>(type: "TEXT", maxLength: 100, nullable: false),
                    Title = table.Column<string>(type: "TEXT", maxLength: 200, nullable: false),
                    Note = table.Column<string>(type: "TEXT", maxLength: 4000, nullable: false),
                    State = table.Column<int>(type: "INTEGER", nullable: false),
                    KernelVersion = table.Column<string>(type: "TEXT", nullable: false),
                    SteelDataRevision = table.Column<string>(type: "TEXT", nullable: false),
                    Reference = table.Column<string>(type: "TEXT", nullable: false),
                    Rating = table.Column<string>(type: "TEXT", nullable: false),
                    Phases = table.Column<int>(type: "INTEGER", nullable: false),
                    RatedPower_kVA = table.Column<double>(type: "REAL", nullable: false),
                    Form = table.Column<string>(type: "TEXT", nullable: false),
                    Steel = table.Column<string>(type: "TEXT", nullable: false),
                    JointType = table.Column<string>(type: "TEXT", nullable: false),
                    JointPositions = table.Column<int>(type: "INTEGER", nullable: false),
                    LimbPeakFluxDensity_T = table.Column<double>(type: "REAL", nullable: false),
                    NoLoadLoss_W = table.Column<double>(type: "REAL", nullable: false),
                    AskedNoLoadLoss_W = table.Column<double>(type: "REAL", nullable: true),
                    NoLoadCurrent_percent = table.Column<double>(type: "REAL", nullable: false),
                    AskedNoLoadCurrent_percent = table.Column<double>(type: "REAL", nullable: true),
                    Mass_kg = table.Column<double>(type: "REAL", nullable: false),
                    MarginAtRated_percent = table.Column<double>(type: "REAL", nullable: false),
                    MarginAtHighest_percent = table.Column<double>(type: "REAL", nullable: false),
                    SearchText = table.Column<string>(type: "TEXT", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("PK_Revisions", x => x.Id);
                    table.ForeignKey(
                        name: "FK_Revisions_Designs_DesignId",
                        column: x => x.DesignId,
                        principalTable: "Designs",
                        principalColumn: "Id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "Contents",
                columns: table => new
                {
                    RevisionId = table.Column<long>(type: "INTEGER", nullable: false),
                    Input = table.Column<string>(type: "TEXT", nullable: false),
                    Study = table.Column<string>(type: "TEXT", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("PK_Contents", x => x.RevisionId);
                    table.ForeignKey(
                        name: "FK_Contents_Revisions_RevisionId",
                        column: x => x.RevisionId,
                        principalTable: "Revisions",
                        principalColumn: "Id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateTable(
                name: "Remarks",
                columns: table => new
                {
                    Id = table.Column<long>(type: "INTEGER", nullable: false)
                        .Annotation("Sqlite:Autoincrement", true),
                    RevisionId = table.Column<long>(type: "INTEGER", nullable: false),
                    At = table.Column<long>(type: "INTEGER", nullable: false),
                    Author = table.Column<string>(type: "TEXT", nullable: false),
                    Text = table.Column<string>(type: "TEXT", maxLength: 4000, nullable: false),
                    SearchText = table.Column<string>(type: "TEXT", nullable: false)
                },
                constraints: table =>
                {
                    table.PrimaryKey("PK_Remarks", x => x.Id);
                    table.ForeignKey(
                        name: "FK_Remarks_Revisions_RevisionId",
                        column: x => x.RevisionId,
                        principalTable: "Revisions",
                        principalColumn: "Id",
                        onDelete: ReferentialAction.Restrict);
                });

            migrationBuilder.CreateIndex(
                name: "IX_Drafts_UpdatedAt",
                table: "Drafts",
                column: "UpdatedAt");

            migrationBuilder.CreateIndex(
                name: "IX_Remarks_RevisionId",
                table: "Remarks",
                column: "RevisionId");

            migrationBuilder.CreateIndex(
                name: "IX_Revisions_CreatedAt",
                table: "Revisions",
                column: "CreatedAt");

            migrationBuilder.CreateIndex(
                name: "IX_Revisions_DesignId_Number",
                table: "Revisions",
                columns: new[] { "DesignId", "Number" },
                unique: true);

            migrationBuilder.CreateIndex(
                name: "IX_Revisions_Steel",
                table: "Revisions",
                column: "Steel");

            migrationBuilder.CreateIndex(
                name: "IX_Steels_NameKey",
                table: "Steels",
                column: "NameKey",
                unique: true);
        }

        /// <inheritdoc />
        protected override void Down(MigrationBuilder migrationBuilder)
        {
            migrationBuilder.DropTable(
                name: "Contents");

            migrationBuilder.DropTable(
                name: "Drafts");

            migrationBuilder.DropTable(
                name: "Remarks");

            migrationBuilder.DropTable(
                name: "Steels");

            migrationBuilder.DropTable(
                name: "Revisions");

            migrationBuilder.DropTable(
                name: "Designs");
        }
    }
}
