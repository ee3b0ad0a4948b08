/** Codes that do not answer 400. */
const statusOf: Readonly<Record<string, number>> = {
  index_not_found: 404,
  document_not_found: 404,
  task_not_found: 404,
  batch_not_found: 404,
  api_key_not_found: 404,
  not_found: 404,
  method_not_allowed: 405,
  index_already_exists: 409,
  api_key_already_exists: 409,
  payload_too_large: 413,
  invalid_content_type: 415,
  missing_content_type: 415,
  missing_authorization_header: 401,
  missing_master_key: 401,
  invalid_api_key: 403,
  feature_not_enabled: 400,
  internal: 500,
};

const authCodes = new Set(['missing_authorization_header', 'missing_master_key', 'invalid_api_key']);

export interface ErrorBody {
  readonly message: string;
  readonly code: string;
  readonly type: string;
  readonly link: string;
}

/** A refusal with the code the protocol names for it; the code decides status and type. */
export class ApiError extends Error {
  constructor(
    readonly code: string,
    message: string,
  ) {
    super(message);
    this.name = 'ApiError';
  }

  get status(): number {
    return statusOf[this.code] ?? 400;
  }

  get body(): ErrorBody {
    const type =
      this.code === 'internal' ? 'internal' : authCodes.has(this.code) ? 'auth' : 'invalid_request';
    return {
      message: this.message,
      code: this.code,
      type,
      link: `https://docs.meilisearch.com/errors#${this.code}`,
    };
  }
}

export const indexNotFound = (uid: string) => new ApiError('index_not_found', `Index \`${uid}\` not found.`);
