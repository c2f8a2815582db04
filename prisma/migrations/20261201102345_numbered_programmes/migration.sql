-- RedefineTables
PRAGMA defer_foreign_keys=ON;
PRAGMA foreign_keys=OFF;
CREATE TABLE "new_Programme" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "clubId" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "position" INTEGER NOT NULL DEFAULT 0,
    "moon" TEXT NOT NULL,
    "hoursText" TEXT NOT NULL,
    "weekdaysText" TEXT NOT NULL,
    "habitNth" INTEGER,
    "habitWeekday" INTEGER,
    "programmePoints" REAL NOT NULL,
    "darknessPoints" REAL NOT NULL,
    "heightPoints" REAL NOT NULL,
    "moonPoints" REAL NOT NULL,
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL,
    CONSTRAINT "Programme_clubId_fkey" FOREIGN KEY ("clubId") REFERENCES "Club" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);
INSERT INTO "new_Programme" ("clubId", "createdAt", "darknessPoints", "habitNth", "habitWeekday", "heightPoints", "hoursText", "id", "moon", "moonPoints", "name", "programmePoints", "updatedAt", "weekdaysText") SELECT "clubId", "createdAt", "darknessPoints", "habitNth", "habitWeekday", "heightPoints", "hoursText", "id", "moon", "moonPoints", "name", "programmePoints", "updatedAt", "weekdaysText" FROM "Programme";
DROP TABLE "Programme";
ALTER TABLE "new_Programme" RENAME TO "Programme";
CREATE UNIQUE INDEX "Programme_clubId_name_key" ON "Programme"("clubId", "name");
PRAGMA foreign_keys=ON;
PRAGMA defer_foreign_keys=OFF;
