import type { EditorCategory, EditorData } from './use-editor-data';

/** What every step of the editor gets. */
export interface StepProps {
  data: EditorData;
  /** Of the chosen or proposed device; undefined until there is one. */
  category: EditorCategory | undefined;
  /** What is wrong with a control, after a try to send. */
  errorOf: (field: string) => string | undefined;
}
