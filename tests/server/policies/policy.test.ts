import { can, decide, type Action, type ActionRecords, type Actor } from '@/server/policies/policy';
import { ROLES, type Role } from '@/shared/api/fields';

const TEAM = 'team-a';
const own = { teamId: TEAM };
const draft = { teamId: TEAM, frozen: false, submittedById: 'somebody' };
const frozen = { teamId: TEAM, frozen: true, submittedById: 'somebody' };
const demoMail = { teamId: TEAM, demo: true };

function actorWith(...roles: readonly Role[]): Actor {
  return { memberId: 'me', personId: 'person', teamId: TEAM, roles, active: true };
}

/** The policy of the team, row by row: who may, in the order of `ROLES`. */
const A = true;
const _ = false;
const TABLE: readonly [
  statement: string,
  action: Action,
  record: ActionRecords[Action],
  allowed: boolean[],
][] = [
  //                                                                         admin integ revie appro insta
  ['see jobs', 'see-jobs', own, [A, A, A, A, _]],
  ['see layouts', 'see-layouts', own, [A, A, A, A, _]],
  ['see a revision that is not frozen', 'see-revision', draft, [A, A, A, A, _]],
  ['see a frozen revision', 'see-revision', frozen, [A, A, A, A, A]],
  ['see parts', 'see-parts', own, [A, A, A, A, _]],
  ['edit jobs and platforms', 'edit-jobs', own, [A, A, _, _, _]],
  ['edit layouts and radios', 'edit-layouts', own, [A, A, _, _, _]],
  ['edit parts', 'edit-parts', own, [A, A, _, _, _]],
  ['comment on a layout', 'comment-on-layout', own, [A, A, A, A, _]],
  ['comment on a revision that is not frozen', 'comment-on-revision', draft, [A, A, A, A, _]],
  ['comment on a frozen revision', 'comment-on-revision', frozen, [A, A, A, A, A]],
  ['save a revision', 'save-revision', own, [A, A, _, _, _]],
  ['submit a revision', 'submit-revision', draft, [A, A, _, _, _]],
  ['return a revision', 'return-revision', draft, [_, _, _, A, _]],
  ['freeze a revision', 'freeze-revision', draft, [_, _, _, A, _]],
  ['see who is in the team', 'see-members', own, [A, A, A, A, A]],
  ['invite', 'invite', own, [A, _, _, _, _]],
  ['change roles', 'change-roles', own, [A, _, _, _, _]],
  ['deactivate', 'deactivate', own, [A, _, _, _, _]],
  ['read the caught mail of the demo', 'see-mails', demoMail, [A, A, A, A, A]],
];

describe.each(TABLE)('may %s', (_statement, action, record, allowed) => {
  test.each(ROLES.map((role, index) => [role, allowed[index]] as const))('%s: %s', (role, expected) => {
    expect(can(actorWith(role), action, record)).toBe(expected);
  });

  test('nobody without a role, of another team, or deactivated', () => {
    expect(can(actorWith(), action, record)).toBe(false);
    expect(decide({ ...actorWith(...ROLES), teamId: 'team-b' }, action, record)).toBe('not-found');
    expect(decide({ ...actorWith(...ROLES), active: false }, action, record)).toBe('not-found');
  });
});

test('the table names every action', () => {
  const named = new Set(TABLE.map(([, action]) => action));
  const every: Record<Action, true> = {
    'see-jobs': true,
    'see-layouts': true,
    'see-revision': true,
    'see-parts': true,
    'edit-jobs': true,
    'edit-layouts': true,
    'edit-parts': true,
    'comment-on-layout': true,
    'comment-on-revision': true,
    'save-revision': true,
    'submit-revision': true,
    'return-revision': true,
    'freeze-revision': true,
    'see-members': true,
    invite: true,
    'change-roles': true,
    deactivate: true,
    'see-mails': true,
  };
  expect([...named].sort()).toEqual(Object.keys(every).sort());
});

/** What each line of the team's rules is about. */
const SUBJECTS: Readonly<Record<string, readonly (readonly [Action, ActionRecords[Action]])[]>> = {
  'see jobs, layouts, revisions': [
    ['see-jobs', own],
    ['see-layouts', own],
    ['see-revision', draft],
    ['see-revision', frozen],
  ],
  'edit platforms, layouts, radios, parts': [
    ['edit-jobs', own],
    ['edit-layouts', own],
    ['edit-parts', own],
  ],
  comment: [
    ['comment-on-layout', own],
    ['comment-on-revision', draft],
    ['comment-on-revision', frozen],
  ],
  'save and submit a revision': [
    ['save-revision', own],
    ['submit-revision', draft],
  ],
  'return or freeze (never one’s own submission)': [
    ['return-revision', draft],
    ['freeze-revision', draft],
  ],
  'invite, change roles, deactivate': [
    ['invite', own],
    ['change-roles', own],
    ['deactivate', own],
  ],
};

test.each`
  may                                                | administrator | integrator | reviewer | approver | installer
  ${'see jobs, layouts, revisions'}                  | ${'yes'}      | ${'yes'}   | ${'yes'} | ${'yes'} | ${'frozen revisions only'}
  ${'edit platforms, layouts, radios, parts'}        | ${'yes'}      | ${'yes'}   | ${'no'}  | ${'no'}  | ${'no'}
  ${'comment'}                                       | ${'yes'}      | ${'yes'}   | ${'yes'} | ${'yes'} | ${'frozen revisions only'}
  ${'save and submit a revision'}                    | ${'yes'}      | ${'yes'}   | ${'no'}  | ${'no'}  | ${'no'}
  ${'return or freeze (never one’s own submission)'} | ${'no'}       | ${'no'}    | ${'no'}  | ${'yes'} | ${'no'}
  ${'invite, change roles, deactivate'}              | ${'yes'}      | ${'no'}    | ${'no'}  | ${'no'}  | ${'no'}
`('the rules of the team hold: $may', ({ may, ...cells }: { may: string } & Record<Role, string>) => {
  for (const role of ROLES) {
    for (const [action, record] of SUBJECTS[may] ?? []) {
      const expected = cells[role] === 'frozen revisions only' ? record === frozen : cells[role] === 'yes';
      expect([role, action, can(actorWith(role), action, record)]).toEqual([role, action, expected]);
    }
  }
  expect(SUBJECTS[may]).not.toHaveLength(0);
});

test('a set of roles may what any of them may, and nothing else', () => {
  for (let set = 0; set < 2 ** ROLES.length; set += 1) {
    const roles = ROLES.filter((_role, index) => (set & (1 << index)) !== 0);
    for (const [statement, action, record, allowed] of TABLE) {
      const expected = roles.some((role) => allowed[ROLES.indexOf(role)]);
      expect([roles, statement, can(actorWith(...roles), action, record)]).toEqual([
        roles,
        statement,
        expected,
      ]);
    }
  }
});

describe('one’s own submission', () => {
  const mine = { ...draft, submittedById: 'me' };
  const integratorAndApprover = actorWith('integrator', 'approver');

  test('is neither returned nor frozen by who submitted it', () => {
    expect(decide(integratorAndApprover, 'freeze-revision', mine)).toBe('own-submission');
    expect(decide(integratorAndApprover, 'return-revision', mine)).toBe('own-submission');
  });

  test('is decided on by another approver', () => {
    expect(can(integratorAndApprover, 'freeze-revision', draft)).toBe(true);
    expect(can({ ...integratorAndApprover, memberId: 'other' }, 'freeze-revision', mine)).toBe(true);
  });
});

test('what may not be seen is not found, what may be seen but not done is forbidden', () => {
  expect(decide(actorWith('installer'), 'edit-layouts', own)).toBe('not-found');
  expect(decide(actorWith('installer'), 'submit-revision', draft)).toBe('not-found');
  expect(decide(actorWith('installer'), 'freeze-revision', frozen)).toBe('forbidden');
  expect(decide(actorWith('reviewer'), 'edit-layouts', own)).toBe('forbidden');
});

test('caught mail is there only in the demo', () => {
  expect(decide(actorWith('administrator'), 'see-mails', { ...demoMail, demo: false })).toBe('not-found');
});
