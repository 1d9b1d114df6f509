/** Who makes a move: a person in a role, or the service on its own. */
export type Mover = 'administrator' | 'approver' | 'participant' | 'support' | 'service';

export interface Transition<S extends string> {
  readonly from: S;
  readonly to: S;
  readonly by: readonly [Mover, ...Mover[]];
  /** What brings the move about. */
  readonly reason: string;
}

/** A machine as data: nothing but this table says which moves exist. */
export interface StateMachine<S extends string = string> {
  /** What has the states, with its article: `The quarter`. */
  readonly subject: string;
  readonly initial: S;
  /** States that nothing leaves. */
  readonly final: readonly S[];
  readonly states: Readonly<
    Record<
      S,
      {
        /** Completes “The quarter is …”. */
        readonly is: string;
        /** A whole clause, told to whoever tries to come here from a state that does not lead here. */
        readonly entry: string;
      }
    >
  >;
  readonly transitions: readonly Transition<S>[];
}

/** A move that the machine does not know. */
export interface RefusedMove {
  readonly from: string;
  readonly to: string;
  readonly reason: string;
}

export type MoveAnswer = { readonly allowed: true } | { readonly allowed: false; readonly reason: string };

/** Whether the machine leads from one state straight to another; a refusal says in a sentence where things stand and what is needed. */
export function moveAllowed(machine: StateMachine, from: string, to: string): MoveAnswer {
  if (machine.transitions.some((transition) => transition.from === from && transition.to === to)) {
    return { allowed: true };
  }
  const here = machine.states[from];
  const there = machine.states[to];
  if (!here || !there) {
    return { allowed: false, reason: `${machine.subject} has no state “${here ? to : from}”.` };
  }
  if (from === to) return { allowed: false, reason: `${machine.subject} is already ${here.is}.` };
  if (machine.final.includes(from)) {
    return { allowed: false, reason: `${machine.subject} is ${here.is}, which is final.` };
  }
  return { allowed: false, reason: `${machine.subject} is ${here.is}; ${there.entry}.` };
}

/** Null when the move is legal, else the refusal. */
export function checkMove(machine: StateMachine, from: string, to: string): RefusedMove | null {
  const answer = moveAllowed(machine, from, to);
  return answer.allowed ? null : { from, to, reason: answer.reason };
}

/**
 * Faults of a table, each as a sentence; empty when it is sound: every state named is known, every state can be reached from the
 * first, every state that is not final can be left and leads to a final one (where there are any), no final state is left, and no
 * move stands twice.
 */
export function faultsOf(machine: StateMachine): string[] {
  const faults: string[] = [];
  const states = Object.keys(machine.states);
  const named = [machine.initial, ...machine.final, ...machine.transitions.flatMap(({ from, to }) => [from, to])];
  for (const state of new Set(named)) {
    if (!states.includes(state)) faults.push(`unknown state ${state}`);
  }
  const reachable = reach(machine.initial, machine.transitions);
  const reversed = machine.transitions.map(({ from, to }) => ({ from: to, to: from }));
  const finishing = new Set(machine.final.flatMap((state) => [...reach(state, reversed)]));
  for (const state of states) {
    const leaves = machine.transitions.some(({ from }) => from === state);
    if (!reachable.has(state)) faults.push(`unreachable state ${state}`);
    if (machine.final.includes(state)) {
      if (leaves) faults.push(`final state ${state} is left`);
    } else if (!leaves) faults.push(`dead end ${state}`);
    else if (!finishing.has(state)) faults.push(`state ${state} never ends`);
  }
  const moves = machine.transitions.map(({ from, to }) => `${from} → ${to}`);
  for (const move of new Set(moves.filter((each, index) => moves.indexOf(each) !== index))) {
    faults.push(`move ${move} stands twice`);
  }
  for (const { from, to } of machine.transitions) {
    if (from === to) faults.push(`move ${from} → ${to} goes nowhere`);
  }
  return faults;
}

function reach(start: string, moves: readonly { readonly from: string; readonly to: string }[]): Set<string> {
  const reached = new Set([start]);
  for (const state of reached) {
    for (const { from, to } of moves) if (from === state) reached.add(to);
  }
  return reached;
}
