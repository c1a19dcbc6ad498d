import { TestBed } from '@angular/core/testing';
import { provideRouter } from '@angular/router';
import { of, throwError } from 'rxjs';
import type { Permission } from '#shared/access/permissions';
import type { Proposal } from '#shared/contracts/proposals';
import { applyChanges } from '#shared/core/ranking/judgement-changes';
import { DEFAULT_CHOICES } from '#shared/core/ranking/ranking-choices';
import { compareRankings } from '#shared/core/ranking/ranking-comparison';
import { buildRankingView } from '#shared/core/ranking/ranking-view-build';
import { fiveVariants } from '#shared/testing/ranking-scenario';
import { ApiProblem } from '../../core/api/api-problem';
import { Session } from '../../core/session/session';
import { ProposalsApi } from '../../data/proposals/proposals-api';
import { ProposalPage } from './proposal-page';

const change = { kind: 'set-aside', resultId: 'r-liftback', reason: 'A wheel cover was missing' } as const;

function comparison() {
  const { inputs, context } = fiveVariants();
  const changed = applyChanges({ inputs, context }, [change], { at: '', by: '' });
  const choices = { ...DEFAULT_CHOICES, cycle: 'short' };
  return compareRankings(
    buildRankingView(inputs, context, choices),
    buildRankingView(changed.inputs, changed.context, choices),
  );
}

function proposal(part: Partial<Proposal> = {}): Proposal {
  return {
    id: 'p',
    title: 'Leave out the run without a wheel cover',
    comment: 'It was found on the photographs',
    changes: [change],
    at: '2026-11-20T09:00:00.000Z',
    by: 'Ines Quill',
    byYou: false,
    state: 'open',
    outcome: {
      query: {},
      comparison: comparison(),
      ground: [{ kind: 'result', resultId: 'r-liftback', name: 'VT-0010' }],
      resultNames: [],
    },
    now: comparison(),
    moved: [],
    ...part,
  };
}

async function page(shown: Proposal, may: readonly Permission[] = ['proposals.decide']) {
  const accept = jest.fn(() => of(proposal({ state: 'accepted' })));
  const drop = jest.fn(() => throwError(() => new ApiProblem('conflict')));
  TestBed.configureTestingModule({
    providers: [
      provideRouter([]),
      { provide: Session, useValue: { may: (asked: Permission) => may.includes(asked) } },
      { provide: ProposalsApi, useValue: { read: () => of(shown), accept, drop } },
    ],
  });
  const fixture = TestBed.createComponent(ProposalPage);
  fixture.componentRef.setInput('programmeId', 'dunlin');
  fixture.componentRef.setInput('proposalId', 'p');
  await fixture.whenStable();
  const element = fixture.nativeElement as HTMLElement;
  const button = (words: string) =>
    [...element.querySelectorAll('button')].find((each) => each.textContent?.trim() === words);
  const say = async (words: string) => {
    const field = element.querySelector('textarea');
    if (!field) throw new Error('Nothing can be said.');
    field.value = words;
    field.dispatchEvent(new Event('input'));
    await fixture.whenStable();
  };
  const press = async (words: string) => {
    button(words)?.click();
    await fixture.whenStable();
  };
  return { element, button, say, press, accept, drop };
}

describe('the page of a proposal', () => {
  it('says what changes, what the proposer saw and that it is the same today', async () => {
    const { element } = await page(proposal());
    expect(element.querySelector('ol')?.textContent).toContain(
      'VT-0010 is set aside: A wheel cover was missing',
    );
    expect(element.querySelector('wl-ranking-moves')?.textContent).toContain('Liftback');
    expect(element.textContent).toContain('The same, figure by figure');
  });

  it('accepts only with a comment, and hands it on', async () => {
    const { button, say, press, accept, element } = await page(proposal());
    expect(button('Accept all of it')?.disabled).toBe(true);
    await say('Seen on the photographs too');
    await press('Accept all of it');
    expect(accept).toHaveBeenCalledWith('dunlin', 'p', 'Seen on the photographs too');
    expect(element.textContent).toContain('accepted');
    expect(button('Drop it')).toBeUndefined();
  });

  it('never offers its author to accept it, but to drop it', async () => {
    const { button } = await page(proposal({ byYou: true }));
    expect(button('Accept all of it')).toBeUndefined();
    expect(button('Drop it')).toBeDefined();
  });

  it('offers nothing to somebody who neither made it nor decides', async () => {
    const { element } = await page(proposal(), []);
    expect(element.querySelector('.decision')).toBeNull();
  });

  it('says what moved beside the change, and that it cannot be accepted any more', async () => {
    const detail = 'VT-0010 was judged anew since this was proposed.';
    const { element, button, say } = await page(
      proposal({ moved: [{ where: 'changes.0', detail }], now: undefined }),
    );
    await say('I would, but');
    expect(element.querySelector('ol li')?.textContent).toContain(detail);
    expect(button('Accept all of it')?.disabled).toBe(true);
    expect(button('Drop it')?.disabled).toBe(false);
  });

  it('shows a refusal in words where it happened', async () => {
    const { element, say, press } = await page(proposal());
    await say('Not convinced');
    await press('Drop it');
    expect(element.querySelector('[role=alert]')).not.toBeNull();
  });
});
