import {
  programmeCreate,
  programmeList,
  programmeOpened,
  programmeRead,
  programmeRetire,
  programmeUpdate,
} from '#shared/contracts/programmes';
import { route, type Route } from '../../http/module';
import {
  addProgramme,
  allProgrammes,
  changeProgramme,
  oneProgramme,
  openedProgramme,
  retireProgramme,
} from './programmes.service';

export const programmesRoutes: readonly Route[] = [
  route(programmeList, async (_input, work) => ({ programmes: [...(await allProgrammes(work))] })),
  route(programmeRead, async ({ params }, work) => oneProgramme(work, params.programmeId)),
  route(programmeOpened, async ({ params }, work) => {
    await openedProgramme(work, params.programmeId);
    return {};
  }),
  route(programmeCreate, async ({ body }, work) => addProgramme(work, body)),
  route(programmeUpdate, async ({ params, body, expectedVersion }, work) =>
    changeProgramme(work, params.programmeId, body, expectedVersion),
  ),
  route(programmeRetire, async ({ params, body, expectedVersion }, work) =>
    retireProgramme(work, params.programmeId, body.retired, expectedVersion),
  ),
];
