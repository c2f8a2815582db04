-- CreateTable
CREATE TABLE "Club" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "name" TEXT NOT NULL,
    "locale" TEXT NOT NULL DEFAULT 'en-GB',
    "bringWords" TEXT NOT NULL DEFAULT '',
    "callOffWords" TEXT NOT NULL DEFAULT '',
    "publicAddress" TEXT,
    "pupilMm" REAL NOT NULL DEFAULT 6,
    "fieldFactor" REAL NOT NULL DEFAULT 2,
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL
);

-- CreateTable
CREATE TABLE "Site" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "clubId" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "latitudeDeg" REAL NOT NULL,
    "longitudeDeg" REAL NOT NULL,
    "elevationM" REAL NOT NULL,
    "zone" TEXT NOT NULL,
    "skyMagPerArcsec2" REAL NOT NULL,
    "bortleClass" INTEGER,
    "extinctionMagPerAirmass" REAL,
    "gateOpens" TEXT,
    "gateCloses" TEXT,
    "directions" TEXT NOT NULL DEFAULT '',
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL,
    CONSTRAINT "Site_clubId_fkey" FOREIGN KEY ("clubId") REFERENCES "Club" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "HorizonPoint" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "siteId" TEXT NOT NULL,
    "position" INTEGER NOT NULL,
    "azimuthDeg" REAL NOT NULL,
    "altitudeDeg" REAL NOT NULL,
    CONSTRAINT "HorizonPoint_siteId_fkey" FOREIGN KEY ("siteId") REFERENCES "Site" ("id") ON DELETE CASCADE ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "LightDome" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "siteId" TEXT NOT NULL,
    "position" INTEGER NOT NULL,
    "azimuthDeg" REAL NOT NULL,
    "widthDeg" REAL NOT NULL,
    "brighteningMag" REAL NOT NULL,
    CONSTRAINT "LightDome_siteId_fkey" FOREIGN KEY ("siteId") REFERENCES "Site" ("id") ON DELETE CASCADE ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "SiteClosure" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "siteId" TEXT NOT NULL,
    "firstDate" TEXT NOT NULL,
    "lastDate" TEXT NOT NULL,
    "why" TEXT NOT NULL,
    CONSTRAINT "SiteClosure_siteId_fkey" FOREIGN KEY ("siteId") REFERENCES "Site" ("id") ON DELETE CASCADE ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "ClubDate" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "clubId" TEXT NOT NULL,
    "date" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "createdAt" DATETIME NOT NULL,
    CONSTRAINT "ClubDate_clubId_fkey" FOREIGN KEY ("clubId") REFERENCES "Club" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Instrument" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "clubId" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "apertureMm" REAL NOT NULL,
    "magnificationsText" TEXT NOT NULL,
    "eyes" INTEGER NOT NULL,
    "transmission" REAL NOT NULL,
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL,
    CONSTRAINT "Instrument_clubId_fkey" FOREIGN KEY ("clubId") REFERENCES "Club" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Target" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "clubId" TEXT NOT NULL,
    "name" TEXT NOT NULL,
    "kind" TEXT NOT NULL,
    "body" TEXT,
    "catalogueId" TEXT,
    "raDeg" REAL,
    "decDeg" REAL,
    "magnitude" REAL,
    "majorArcmin" REAL,
    "minorArcmin" REAL,
    "comaArcmin" REAL,
    "gloss" TEXT NOT NULL DEFAULT '',
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL,
    CONSTRAINT "Target_clubId_fkey" FOREIGN KEY ("clubId") REFERENCES "Club" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "ElementSet" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "targetId" TEXT NOT NULL,
    "number" INTEGER NOT NULL,
    "receivedAt" DATETIME NOT NULL,
    "source" TEXT NOT NULL,
    "designation" TEXT NOT NULL,
    "bodyKind" TEXT NOT NULL,
    "epochTtJd" REAL,
    "perihelionTtJd" REAL NOT NULL,
    "perihelionDistanceAu" REAL NOT NULL,
    "eccentricity" REAL NOT NULL,
    "inclinationDeg" REAL NOT NULL,
    "nodeDeg" REAL NOT NULL,
    "argumentOfPerihelionDeg" REAL NOT NULL,
    "absoluteMagnitude" REAL,
    "activity" REAL,
    "slope" REAL,
    "givenText" TEXT NOT NULL,
    CONSTRAINT "ElementSet_targetId_fkey" FOREIGN KEY ("targetId") REFERENCES "Target" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Programme" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "clubId" TEXT NOT NULL,
    "name" TEXT NOT NULL,
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

-- CreateTable
CREATE TABLE "ProgrammeItem" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "programmeId" TEXT NOT NULL,
    "position" INTEGER NOT NULL,
    "targetId" TEXT NOT NULL,
    "instrumentId" TEXT NOT NULL,
    "weight" REAL NOT NULL,
    "leastMinutes" REAL NOT NULL,
    "leastAltitudeDeg" REAL NOT NULL,
    CONSTRAINT "ProgrammeItem_programmeId_fkey" FOREIGN KEY ("programmeId") REFERENCES "Programme" ("id") ON DELETE CASCADE ON UPDATE CASCADE,
    CONSTRAINT "ProgrammeItem_targetId_fkey" FOREIGN KEY ("targetId") REFERENCES "Target" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "ProgrammeItem_instrumentId_fkey" FOREIGN KEY ("instrumentId") REFERENCES "Instrument" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Evening" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "clubId" TEXT NOT NULL,
    "siteId" TEXT NOT NULL,
    "programmeId" TEXT NOT NULL,
    "date" TEXT NOT NULL,
    "score" REAL NOT NULL,
    "judgedText" TEXT NOT NULL,
    "judgedAt" DATETIME NOT NULL,
    CONSTRAINT "Evening_clubId_fkey" FOREIGN KEY ("clubId") REFERENCES "Club" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Evening_siteId_fkey" FOREIGN KEY ("siteId") REFERENCES "Site" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Evening_programmeId_fkey" FOREIGN KEY ("programmeId") REFERENCES "Programme" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "Event" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "clubId" TEXT NOT NULL,
    "eveningId" TEXT NOT NULL,
    "title" TEXT NOT NULL,
    "words" TEXT NOT NULL,
    "status" TEXT NOT NULL,
    "uid" TEXT NOT NULL,
    "sequence" INTEGER NOT NULL DEFAULT 0,
    "startsAt" DATETIME NOT NULL,
    "endsAt" DATETIME NOT NULL,
    "zone" TEXT NOT NULL,
    "publishedAt" DATETIME,
    "callOffWhy" TEXT,
    "createdAt" DATETIME NOT NULL,
    "updatedAt" DATETIME NOT NULL,
    CONSTRAINT "Event_clubId_fkey" FOREIGN KEY ("clubId") REFERENCES "Club" ("id") ON DELETE RESTRICT ON UPDATE CASCADE,
    CONSTRAINT "Event_eveningId_fkey" FOREIGN KEY ("eveningId") REFERENCES "Evening" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "EventStep" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "eventId" TEXT NOT NULL,
    "number" INTEGER NOT NULL,
    "what" TEXT NOT NULL,
    "at" DATETIME NOT NULL,
    "why" TEXT NOT NULL,
    CONSTRAINT "EventStep_eventId_fkey" FOREIGN KEY ("eventId") REFERENCES "Event" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateIndex
CREATE UNIQUE INDEX "Club_name_key" ON "Club"("name");

-- CreateIndex
CREATE UNIQUE INDEX "Site_clubId_name_key" ON "Site"("clubId", "name");

-- CreateIndex
CREATE UNIQUE INDEX "HorizonPoint_siteId_position_key" ON "HorizonPoint"("siteId", "position");

-- CreateIndex
CREATE UNIQUE INDEX "LightDome_siteId_position_key" ON "LightDome"("siteId", "position");

-- CreateIndex
CREATE INDEX "SiteClosure_siteId_firstDate_idx" ON "SiteClosure"("siteId", "firstDate");

-- CreateIndex
CREATE UNIQUE INDEX "ClubDate_clubId_date_name_key" ON "ClubDate"("clubId", "date", "name");

-- CreateIndex
CREATE UNIQUE INDEX "Instrument_clubId_name_key" ON "Instrument"("clubId", "name");

-- CreateIndex
CREATE UNIQUE INDEX "Target_clubId_name_key" ON "Target"("clubId", "name");

-- CreateIndex
CREATE UNIQUE INDEX "ElementSet_targetId_number_key" ON "ElementSet"("targetId", "number");

-- CreateIndex
CREATE UNIQUE INDEX "Programme_clubId_name_key" ON "Programme"("clubId", "name");

-- CreateIndex
CREATE UNIQUE INDEX "ProgrammeItem_programmeId_position_key" ON "ProgrammeItem"("programmeId", "position");

-- CreateIndex
CREATE UNIQUE INDEX "ProgrammeItem_programmeId_targetId_key" ON "ProgrammeItem"("programmeId", "targetId");

-- CreateIndex
CREATE INDEX "Evening_clubId_date_idx" ON "Evening"("clubId", "date");

-- CreateIndex
CREATE UNIQUE INDEX "Evening_siteId_programmeId_date_key" ON "Evening"("siteId", "programmeId", "date");

-- CreateIndex
CREATE UNIQUE INDEX "Event_uid_key" ON "Event"("uid");

-- CreateIndex
CREATE INDEX "Event_clubId_startsAt_idx" ON "Event"("clubId", "startsAt");

-- CreateIndex
CREATE UNIQUE INDEX "EventStep_eventId_number_key" ON "EventStep"("eventId", "number");
