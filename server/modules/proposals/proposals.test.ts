import { randomUUID } from 'node:crypto';
import { adoptionList, evidenceAdopt } from '#shared/contracts/adoptions';
import {
  facilityCreate,
  facilityRead,
  facilityUpdate,
  facilityVersionList,
} from '#shared/contracts/facilities';
import { policiesRead } from '#shared/contracts/policies';
import { programmeCreate, programmeRead } from '#shared/contracts/programmes';
import {
  proposalAccept,
  proposalDrop,
  proposalList,
  proposalMake,
  proposalRead,
  type JudgementChange,
} from '#shared/contracts/proposals';
import { rankingContextRead, rankingInputsRead, rankingViewRead } from '#shared/contracts/rankings';
import { resultEnter, resultRead, resultWithdraw } from '#shared/contracts/results';
import { variantCreate } from '#shared/contracts/variants';
import { resultsJudge } from '#shared/contracts/judgements';
import { applyChanges } from '#shared/core/ranking/judgement-changes';
import { DEFAULT_CHOICES } from '#shared/core/ranking/ranking-choices';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import type { RankingView } from '#shared/core/ranking/ranking-view';
import { facilityFields, programmeFields, resultFields, variantFields } from '#shared/testing/domain-fields';
import { startApi, type ApiHarness } from '../../testing/api-harness';
import type { ApiMember } from '../../testing/as-member';

const COMMENT = 'The tape came off after the third run';
const figures = ({ rows }: RankingView) =>
  rows.map(({ variantId, figure }) => ({ variantId, dragAreaM2: figure.dragAreaM2 }));

describe('a proposal', () => {
  let api: ApiHarness;
  let manager: ApiMember;
  let aerodynamicist: ApiMember;
  let programmeId: string;
  let facilityId: string;
  let hatch: string;
  let sport: string;
  let programmes = 0;
  const ids = new Map<string, string>();
  const resultId = (name: string) => ids.get(name) ?? '';
  const at = (proposalId: string) => ({ programmeId, proposalId });

  const enter = async (name: string, variantId: string, value: number, testDate: string) => {
    const fields = resultFields(
      { variantId, facilityId },
      { name, testDate, points: [{ yawDeg: 0, value, s: 0.0006, n: 3 }] },
    );
    const { id } = await aerodynamicist.ok(resultEnter, { params: { programmeId }, body: fields });
    ids.set(name, id);
  };
  const sources = async (member: ApiMember) => ({
    inputs: await member.ok(rankingInputsRead, { params: { programmeId }, query: { evidence: 'all' } }),
    context: await member.ok(rankingContextRead, { params: { programmeId } }),
  });
  const body = async (member: ApiMember, changes: readonly JudgementChange[]) => {
    const now = await sources(member);
    const tried = applyChanges(now, changes, { at: '2026-12-01T00:00:00Z', by: 'me' });
    const view = (each: typeof now) => buildRankingView(each.inputs, each.context, DEFAULT_CHOICES);
    const seen = { before: figures(view(now)), after: figures(view(tried)) };
    return { title: 'Leave out the run with tape', comment: COMMENT, changes, query: {}, seen };
  };
  const propose = async (member: ApiMember, ...changes: readonly JudgementChange[]) =>
    member.ok(proposalMake, { params: { programmeId }, body: await body(member, changes) });
  const accept = (proposalId: string) =>
    aerodynamicist.ok(proposalAccept, { params: at(proposalId), body: { comment: 'Agreed' } });
  const shown = async () => aerodynamicist.ok(rankingViewRead, { params: { programmeId } });

  beforeAll(async () => {
    api = await startApi();
    manager = await api.asMember('programme-manager');
    aerodynamicist = await api.asMember('aerodynamicist');
  });
  afterAll(() => api.close());

  beforeEach(async () => {
    programmes += 1;
    const made = await manager.ok(programmeCreate, {
      body: programmeFields({ name: `Dunlin ${programmes}` }),
    });
    programmeId = made.id;
    const facility = await aerodynamicist.ok(facilityCreate, {
      body: facilityFields({ name: `Halmere ${programmes}` }),
    });
    facilityId = facility.id;
    const variant = async (name: string) =>
      (await manager.ok(variantCreate, { params: { programmeId }, body: variantFields({ name }) })).id;
    hatch = await variant('Hatch');
    sport = await variant('Sport');
    await enter('H1', hatch, 0.27, '2026-09-01');
    await enter('H2', hatch, 0.3, '2026-10-01');
    await enter('S1', sport, 0.285, '2026-09-01');
  });

  it('keeps what the changes come to, and names its author and what it stands on', async () => {
    const proposal = await propose(manager, { kind: 'set-aside', resultId: resultId('H2'), reason: COMMENT });
    expect(proposal).toMatchObject({ state: 'open', byYou: true, moved: [] });
    expect(proposal.outcome.ground).toEqual([{ kind: 'result', resultId: resultId('H2'), name: 'H2' }]);
    const [first] = proposal.outcome.comparison.moves;
    expect(first).toMatchObject({ variantId: hatch, before: { rank: 2 }, after: { rank: 1 }, places: 1 });
    expect(proposal.now).toEqual(proposal.outcome.comparison);
    expect((await shown()).rows[0]?.variantId).toBe(sport);
    const { proposals } = await aerodynamicist.ok(proposalList, { params: { programmeId } });
    expect(proposals).toEqual([expect.objectContaining({ id: proposal.id, state: 'open', byYou: false })]);
  });

  it('is accepted whole: the ranking is then what the proposer saw', async () => {
    const changes: readonly JudgementChange[] = [
      { kind: 'evidence', variantId: sport, resultIds: [resultId('S1')], rule: 'newest' },
      { kind: 'set-aside', resultId: resultId('H2'), reason: COMMENT },
      { kind: 'facility', facilityId, biasURelative: 0.01 },
      { kind: 'policies', values: { frictionShare: 0.1 + programmes / 1000 } },
      { kind: 'friction-line', frictionLine: 'off' },
    ];
    const { seen } = await body(manager, changes);
    const proposal = await propose(manager, ...changes);
    const accepted = await accept(proposal.id);
    expect(accepted).toMatchObject({ state: 'accepted', decision: { comment: 'Agreed' }, moved: [] });
    expect(accepted.now).toBeUndefined();
    expect(figures(await shown())).toEqual(seen.after);

    const facility = await aerodynamicist.ok(facilityRead, { params: { facilityId } });
    expect(facility).toMatchObject({ versionNumber: 2, biasURelative: 0.01 });
    const { versions } = await aerodynamicist.ok(facilityVersionList, { params: { facilityId } });
    expect(versions[0]?.comment).toBe(`Leave out the run with tape. ${COMMENT}`);
    const policies = await aerodynamicist.ok(policiesRead);
    expect(policies.versions[0]?.values.frictionShare).toBe(0.1 + programmes / 1000);
    const programme = await manager.ok(programmeRead, { params: { programmeId } });
    expect(programme).toMatchObject({ frictionLine: 'off', name: `Dunlin ${programmes}` });
    const { adoptions } = await aerodynamicist.ok(adoptionList, { params: { programmeId } });
    expect(adoptions).toEqual([expect.objectContaining({ variantId: sport, resultIds: [resultId('S1')] })]);
    const result = await aerodynamicist.ok(resultRead, { params: { programmeId, resultId: resultId('H2') } });
    expect(result.judgement).toMatchObject({ setAsideReason: COMMENT });
  });

  it('sets a result aside and lets its variant rest on the others in one go', async () => {
    await enter('H3', hatch, 0.272, '2026-09-05');
    await aerodynamicist.ok(evidenceAdopt, {
      params: { programmeId },
      body: {
        adoptions: [{ variantId: hatch, resultIds: [resultId('H1'), resultId('H2')], rule: 'weighted-mean' }],
        comment: 'Both entries',
      },
    });
    const changes: readonly JudgementChange[] = [
      { kind: 'set-aside', resultId: resultId('H2'), reason: COMMENT },
      {
        kind: 'evidence',
        variantId: hatch,
        resultIds: [resultId('H1'), resultId('H3')],
        rule: 'weighted-mean',
      },
    ];
    const { seen } = await body(manager, changes);
    const { id, outcome } = await propose(manager, ...changes);
    expect(outcome.resultNames.map(({ name }) => name).sort()).toEqual(['H1', 'H3']);
    await accept(id);
    const { rows } = await shown();
    expect(rows.find(({ variantId }) => variantId === hatch)?.combination?.weights).toHaveLength(2);
    expect(rows.map(({ variantId }) => variantId)).toEqual(seen.after.map(({ variantId }) => variantId));
    rows.forEach(({ figure }, row) => {
      expect(figure.dragAreaM2).toBeCloseTo(seen.after[row]?.dragAreaM2 ?? 0, 12);
    });
  });

  it('brings a result back and lets it count though it is not comparable', async () => {
    const { id } = await aerodynamicist.ok(resultEnter, {
      params: { programmeId },
      body: resultFields(
        { variantId: sport, facilityId },
        {
          name: 'S2',
          testDate: '2026-11-01',
          condition: { ground: 'fixed-floor', wheels: 'rotating' },
          points: [{ yawDeg: 0, value: 0.26, s: 0.0006, n: 3 }],
        },
      ),
    });
    await aerodynamicist.ok(resultsJudge, {
      params: { programmeId },
      body: {
        judgements: [{ resultId: id, reynolds: { kind: 'friction-line' }, setAsideReason: 'Wrong floor' }],
      },
    });
    const proposal = await propose(
      manager,
      { kind: 'bring-back', resultId: id },
      { kind: 'include-not-comparable', resultId: id, reason: 'The floor is worth less than a count here' },
    );
    await accept(proposal.id);
    const { judgement } = await aerodynamicist.ok(resultRead, { params: { programmeId, resultId: id } });
    expect(judgement?.setAsideReason).toBeUndefined();
    expect(judgement?.includedReason).toContain('less than a count');
    expect((await shown()).rows[0]).toMatchObject({ variantId: sport, cautions: ['included-with-reason'] });
  });

  it('is never accepted by its author, nor by whose role does not judge', async () => {
    const change: JudgementChange = { kind: 'set-aside', resultId: resultId('H2'), reason: COMMENT };
    const own = await propose(aerodynamicist, change);
    const params = at(own.id);
    const refused = await aerodynamicist.refused(proposalAccept, { params, body: { comment: 'Mine' } });
    expect(refused.code).toBe('forbidden');
    for (const role of ['programme-manager', 'stylist', 'viewer', 'administrator'] as const) {
      const member = await api.asMember(role);
      expect((await member.refused(proposalAccept, { params, body: { comment: 'Agreed' } })).code).toBe(
        'forbidden',
      );
    }
    const stylist = await api.asMember('stylist');
    expect((await stylist.refused(proposalList, { params: { programmeId } })).code).toBe('forbidden');
    const dropped = await manager.refused(proposalDrop, { params, body: { comment: 'Not mine' } });
    expect(dropped.code).toBe('forbidden');
    expect((await aerodynamicist.ok(proposalRead, { params })).state).toBe('open');
  });

  it('is dropped by its author with a comment, and then it is closed', async () => {
    const { id } = await propose(manager, { kind: 'friction-line', frictionLine: 'off' });
    const dropped = await manager.ok(proposalDrop, { params: at(id), body: { comment: 'Thought again' } });
    expect(dropped).toMatchObject({ state: 'dropped', decision: { comment: 'Thought again' } });
    const late = await aerodynamicist.refused(proposalAccept, { params: at(id), body: { comment: 'Yes' } });
    expect(late).toMatchObject({ code: 'wrong-state' });
    expect(late.detail).toContain('dropped this proposal already');
  });

  it('is a conflict that says what moved, and nothing of it holds', async () => {
    const proposal = await propose(
      manager,
      { kind: 'friction-line', frictionLine: 'off' },
      { kind: 'facility', facilityId, biasURelative: 0.01 },
      { kind: 'evidence', variantId: sport, resultIds: [resultId('S1')], rule: 'newest' },
      { kind: 'set-aside', resultId: resultId('H2'), reason: COMMENT },
    );
    await aerodynamicist.ok(facilityUpdate, {
      params: { facilityId },
      ifMatch: 1,
      body: {
        ...facilityFields({ name: `Halmere ${programmes}`, biasURelative: 0.02 }),
        comment: 'Recalibrated',
      },
    });
    await aerodynamicist.ok(evidenceAdopt, {
      params: { programmeId },
      body: {
        adoptions: [{ variantId: sport, resultIds: [resultId('S1')], rule: 'newest' }],
        comment: 'Adopted meanwhile',
      },
    });
    await aerodynamicist.ok(resultWithdraw, {
      params: { programmeId, resultId: resultId('H2') },
      body: { reason: 'Tape, indeed' },
    });
    const open = await manager.ok(proposalRead, { params: at(proposal.id) });
    expect(open.moved.map(({ where }) => where)).toEqual(['changes.1', 'changes.2', 'changes.3']);
    expect(open.now).not.toEqual(open.outcome.comparison);

    const problem = await aerodynamicist.refused(proposalAccept, {
      params: at(proposal.id),
      body: { comment: 'Agreed' },
    });
    expect(problem.code).toBe('conflict');
    expect(problem.issues?.map(({ detail }) => detail)).toEqual([
      expect.stringContaining('version 1 then, 2 now'),
      expect.stringContaining('What Sport rests on was decided anew'),
      'H2 was withdrawn since.',
    ]);
    expect((await manager.ok(programmeRead, { params: { programmeId } })).frictionLine).not.toBe('off');
    expect((await manager.ok(proposalRead, { params: at(proposal.id) })).state).toBe('open');
  });

  it('leaves nothing half done where a later change is refused', async () => {
    await enter('S2', sport, 0.28, '2026-11-01');
    const proposal = await propose(
      manager,
      { kind: 'facility', facilityId, biasURelative: 0.01 },
      { kind: 'include-not-comparable', resultId: resultId('H2'), reason: 'It is comparable, in truth' },
    );
    const problem = await aerodynamicist.refused(proposalAccept, {
      params: at(proposal.id),
      body: { comment: 'Agreed' },
    });
    expect(problem).toMatchObject({ code: 'unusable-input', reason: 'comparable' });
    expect((await aerodynamicist.ok(facilityRead, { params: { facilityId } })).versionNumber).toBe(1);
    expect((await aerodynamicist.ok(proposalRead, { params: at(proposal.id) })).state).toBe('open');
  });

  it('holds once, however often and at the same time it is accepted', async () => {
    const { id } = await propose(manager, { kind: 'facility', facilityId, biasURelative: 0.01 });
    const [key, input] = [randomUUID(), { params: at(id), body: { comment: 'Agreed' } }];
    const answers = await Promise.all([
      aerodynamicist.call(proposalAccept, { ...input, key }),
      aerodynamicist.call(proposalAccept, { ...input, key: randomUUID() }),
    ]);
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409]);
    const again = await aerodynamicist.call(proposalAccept, { ...input, key });
    expect(again.status).toBe(answers[0]?.status);
    const { versions } = await aerodynamicist.ok(facilityVersionList, { params: { facilityId } });
    expect(versions.map(({ number }) => number)).toEqual([2, 1]);
  });

  it('is not made on a ranking that moved since it was seen', async () => {
    const order = await body(manager, [{ kind: 'friction-line', frictionLine: 'off' }]);
    await enter('H3', hatch, 0.26, '2026-11-02');
    const problem = await manager.refused(proposalMake, { params: { programmeId }, body: order });
    expect(problem).toMatchObject({ code: 'conflict', where: 'seen' });
  });

  it.each([
    [
      'twice about the same',
      (id: string): readonly JudgementChange[] => [
        { kind: 'set-aside', resultId: id, reason: COMMENT },
        { kind: 'set-aside', resultId: id, reason: 'Again' },
      ],
      'changes.1',
    ],
    ['brings back what counts', (id: string) => [{ kind: 'bring-back', resultId: id }], 'changes.0'],
    [
      'sets aside what it includes',
      (id: string) => [
        { kind: 'include-not-comparable', resultId: id, reason: COMMENT },
        { kind: 'set-aside', resultId: id, reason: COMMENT },
      ],
      'changes.0',
    ],
    [
      'rests on what it sets aside',
      (id: string) => [
        { kind: 'set-aside', resultId: id, reason: COMMENT },
        { kind: 'evidence', variantId: hatch, resultIds: [id], rule: 'newest' },
      ],
      'changes.1',
    ],
    ['says nothing', () => [{ kind: 'policies', values: {} }], 'changes.0'],
  ] satisfies readonly (readonly [string, (id: string) => readonly JudgementChange[], string])[])(
    'is refused where it %s',
    async (_name, changes, where) => {
      const order = await body(manager, changes(resultId('H2')));
      const problem = await manager.refused(proposalMake, { params: { programmeId }, body: order });
      expect(problem).toMatchObject({ code: 'unusable-input', where });
    },
  );

  it('is not there for another organisation', async () => {
    const { id } = await propose(manager, { kind: 'friction-line', frictionLine: 'off' });
    const stranger = await api.asMember('aerodynamicist', api.second);
    const params = at(id);
    const input = { params, body: { comment: 'Agreed' } };
    expect((await stranger.refused(proposalRead, { params })).code).toBe('not-found');
    expect((await stranger.refused(proposalAccept, input)).code).toBe('not-found');
    expect((await stranger.refused(proposalDrop, input)).code).toBe('not-found');
  });
});
