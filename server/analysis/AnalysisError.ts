/** Why an analysis gave no reading. */
export type AnalysisErrorCode = 'analysis_timeout' | 'analysis_cancelled' | 'analysis_failed' | 'analysis_busy';

/** An analysis that ended without a reading, though nothing need be wrong with the pictures. */
export class AnalysisError extends Error {
  readonly code: AnalysisErrorCode;

  constructor(code: AnalysisErrorCode, message: string, options?: ErrorOptions) {
    super(message, options);
    this.name = 'AnalysisError';
    this.code = code;
  }
}
