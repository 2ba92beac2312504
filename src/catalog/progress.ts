/** Told how far a long piece of work is; called often, so it must be quick. */
export type Progress = (done: number, total: number) => void;

export const NO_PROGRESS: Progress = () => undefined;
