export type TriageAnswers = Record<string, string | readonly string[]>;
