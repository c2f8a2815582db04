-- CreateTable
CREATE TABLE "Packet" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "eventId" TEXT NOT NULL,
    "revision" TEXT NOT NULL,
    "imprintText" TEXT NOT NULL,
    "computedAt" DATETIME NOT NULL,
    CONSTRAINT "Packet_eventId_fkey" FOREIGN KEY ("eventId") REFERENCES "Event" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- CreateTable
CREATE TABLE "PacketPrinting" (
    "id" TEXT NOT NULL PRIMARY KEY,
    "packetId" TEXT NOT NULL,
    "number" INTEGER NOT NULL,
    "at" DATETIME NOT NULL,
    "paper" TEXT NOT NULL,
    "sheetsText" TEXT NOT NULL,
    CONSTRAINT "PacketPrinting_packetId_fkey" FOREIGN KEY ("packetId") REFERENCES "Packet" ("id") ON DELETE RESTRICT ON UPDATE CASCADE
);

-- Added in place: the table is not made anew, so that nothing that hangs on a site is touched.
ALTER TABLE "Site" ADD COLUMN "hazards" TEXT NOT NULL DEFAULT '';
ALTER TABLE "Site" ADD COLUMN "emergencyWords" TEXT NOT NULL DEFAULT '';

-- CreateIndex
CREATE UNIQUE INDEX "Packet_eventId_revision_key" ON "Packet"("eventId", "revision");

-- CreateIndex
CREATE UNIQUE INDEX "PacketPrinting_packetId_number_key" ON "PacketPrinting"("packetId", "number");
