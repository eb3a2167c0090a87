import type { BlockSize, Drawing } from "../piece/drawing";

/** What the drafting page changes: the drawing, and the size that it is finished at. */
export interface Draft {
  readonly drawing: Drawing;
  readonly size: BlockSize;
}

export interface DraftState {
  readonly present: Draft;
  /** Oldest first; there is no limit, since drafts share all that did not change. */
  readonly past: readonly Draft[];
  /** What undo took back, the next to come again last. */
  readonly future: readonly Draft[];
  /** The draft as it was when the gesture began; null between gestures. Every move is reckoned from it. */
  readonly grabbed: Draft | null;
}

export type DraftAction =
  /** A change in one go: one step of undo. */
  | { readonly kind: "change"; readonly draft: Draft }
  /** A gesture begins, moves as often as it likes, and ends as one step, or is called off and leaves nothing. */
  | { readonly kind: "grab" }
  | { readonly kind: "drag"; readonly draft: Draft }
  | { readonly kind: "release" }
  | { readonly kind: "cancel" }
  | { readonly kind: "undo" }
  | { readonly kind: "redo" }
  /** Another block is opened: nothing of the one before can come back. */
  | { readonly kind: "open"; readonly draft: Draft };

export function openDraft(draft: Draft): DraftState {
  return { present: draft, past: [], future: [], grabbed: null };
}

/** Undo and redo do nothing while a gesture goes on, and a drag does nothing without one. */
export function draftReducer(state: DraftState, action: DraftAction): DraftState {
  switch (action.kind) {
    case "open":
      return openDraft(action.draft);
    case "change":
      return step(release(state), action.draft);
    case "grab":
      return state.grabbed ? state : { ...state, grabbed: state.present };
    case "drag":
      return state.grabbed ? { ...state, present: action.draft } : state;
    case "release":
      return release(state);
    case "cancel":
      return state.grabbed ? { ...state, present: state.grabbed, grabbed: null } : state;
    case "undo":
      return undo(state);
    case "redo":
      return redo(state);
  }
}

function release(state: DraftState): DraftState {
  if (!state.grabbed) return state;
  return step({ ...state, present: state.grabbed, grabbed: null }, state.present);
}

function step(state: DraftState, draft: Draft): DraftState {
  if (draft === state.present) return state;
  return { present: draft, past: [...state.past, state.present], future: [], grabbed: null };
}

function undo(state: DraftState): DraftState {
  const last = state.past.at(-1);
  if (!last || state.grabbed) return state;
  return { present: last, past: state.past.slice(0, -1), future: [...state.future, state.present], grabbed: null };
}

function redo(state: DraftState): DraftState {
  const next = state.future.at(-1);
  if (!next || state.grabbed) return state;
  return { present: next, past: [...state.past, state.present], future: state.future.slice(0, -1), grabbed: null };
}
