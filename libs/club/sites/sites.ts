import { skyFromBortle } from '#darkness';
import lookUpZone from 'tz-lookup';
import { type z } from 'zod';
import { type Prisma } from '../database/generated/client';
import { type Database } from '../database/openDatabase';
import { checked } from '../input/checked';
import { refuseTakenName, requireNamed } from '../input/named';
import { clubId } from '../settings/club';
import { SiteInput } from './siteInput';
import { siteParts, siteView, type SiteView } from './siteView';

/** Enters a site. Its zone is that of the place where none is given. */
export async function createSite(database: Database, input: SiteInput): Promise<SiteView> {
  const fields = checked(SiteInput, input);
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    refuseTakenName(await names(tx, club), fields.name, 'site');
    const now = database.now();
    const row = await tx.site.create({
      data: { clubId: club, ...columns(fields), ...parts(fields), createdAt: now, updatedAt: now },
      include: siteParts,
    });
    return siteView(row);
  });
}

/** Changes the given fields of a site (id or name) and leaves the others; lists are replaced whole. */
export async function updateSite(
  database: Database,
  site: string,
  change: Partial<SiteInput>,
): Promise<SiteView> {
  return database.client.$transaction(async (tx) => {
    const club = await clubId(tx);
    const all = await names(tx, club);
    const { id } = requireNamed(all, site, 'site', 'site');
    const kept = siteView(await tx.site.findUniqueOrThrow({ where: { id }, include: siteParts }));
    const fields = checked(SiteInput, { ...asInput(kept), ...change });
    refuseTakenName(all, fields.name, 'site', id);
    await tx.horizonPoint.deleteMany({ where: { siteId: id } });
    await tx.lightDome.deleteMany({ where: { siteId: id } });
    await tx.siteClosure.deleteMany({ where: { siteId: id } });
    const row = await tx.site.update({
      where: { id },
      data: { ...columns(fields), ...parts(fields), updatedAt: database.now() },
      include: siteParts,
    });
    return siteView(row);
  });
}

/** All sites, by name. */
export async function listSites(database: Database): Promise<readonly SiteView[]> {
  const rows = await database.client.site.findMany({
    where: { clubId: await clubId(database.client) },
    include: siteParts,
    orderBy: { name: 'asc' },
  });
  return rows.map(siteView);
}

/** One site by id or name; a ClubProblem of kind 'notFound' names the sites there are. */
export async function getSite(database: Database, site: string, field = 'site'): Promise<SiteView> {
  const { client } = database;
  const { id } = requireNamed(await names(client, await clubId(client)), site, 'site', field);
  return siteView(await client.site.findUniqueOrThrow({ where: { id }, include: siteParts }));
}

function names(client: Prisma.TransactionClient, club: string) {
  return client.site.findMany({
    where: { clubId: club },
    select: { id: true, name: true },
    orderBy: { name: 'asc' },
  });
}

type SiteFields = z.output<typeof SiteInput>;

function columns(fields: SiteFields) {
  const { name, latitudeDeg, longitudeDeg, elevationM, extinctionMagPerAirmass, sky, gate } = fields;
  const { directions, hazards, emergencyWords } = fields;
  const bortleClass = sky.bortleClass ?? null;
  return {
    name,
    latitudeDeg,
    longitudeDeg,
    elevationM,
    zone: fields.zone ?? lookUpZone(latitudeDeg, longitudeDeg),
    skyMagPerArcsec2: bortleClass === null ? sky.magPerArcsec2! : skyFromBortle(bortleClass),
    bortleClass,
    extinctionMagPerAirmass,
    gateOpens: gate.opens,
    gateCloses: gate.closes,
    directions,
    hazards,
    emergencyWords,
  };
}

function parts({ horizon, domes, closures }: SiteFields) {
  return {
    horizon: { create: horizon.map((point, position) => ({ position, ...point })) },
    domes: { create: domes.map((dome, position) => ({ position, ...dome })) },
    closures: { create: closures.map(({ from, to, why }) => ({ firstDate: from, lastDate: to, why })) },
  };
}

function asInput({ id: _id, sky, ...rest }: SiteView) {
  return {
    ...rest,
    sky: sky.bortleClass === null ? { magPerArcsec2: sky.magPerArcsec2 } : { bortleClass: sky.bortleClass },
  };
}
