import { type Database } from '#club';
import { type DynamicModule, Module } from '@nestjs/common';
import { ChartsController } from './api/chartsController';
import { ClubController } from './api/clubController';
import { EveningsController } from './api/eveningsController';
import { EventsController } from './api/eventsController';
import { InstrumentsController } from './api/instrumentsController';
import { PacketsController } from './api/packetsController';
import { ProgrammesController } from './api/programmesController';
import { SitesController } from './api/sitesController';
import { TargetsController } from './api/targetsController';
import { DATABASE } from './database';
import { FeedController } from './feed/feedController';
import { KeptFeeds } from './feed/keptFeeds';
import { AssetsController } from './pages/assetsController';
import { KeptNotes } from './pages/keptNotes';
import { PagesController } from './pages/pagesController';
import { SeasonPages } from './pages/seasonPages';
import { SearchesController } from './searches/searchesController';
import { SearchJobs } from './searches/searchJobs';

/** Every route of the server, over one open database. */
@Module({})
export class ServerModule {
  static over(database: Database): DynamicModule {
    return {
      module: ServerModule,
      controllers: [
        ClubController,
        SitesController,
        InstrumentsController,
        TargetsController,
        ProgrammesController,
        SearchesController,
        EveningsController,
        ChartsController,
        PacketsController,
        EventsController,
        FeedController,
        AssetsController,
        PagesController,
      ],
      providers: [
        { provide: DATABASE, useValue: database },
        { provide: KeptFeeds, useFactory: () => new KeptFeeds(database) },
        { provide: KeptNotes, useFactory: () => new KeptNotes(database) },
        { provide: SearchJobs, useFactory: () => new SearchJobs(database) },
        { provide: SeasonPages, useFactory: () => new SeasonPages(database) },
      ],
    };
  }
}
