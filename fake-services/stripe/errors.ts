export interface ApiErrorDetails {
  status: number;
  type: "invalid_request_error" | "card_error" | "idempotency_error" | "api_error";
  message: string;
  code?: string;
  param?: string;
  declineCode?: string;
  /** True when nothing was tried yet: such a result is not kept under the idempotency key. */
  beforeWork?: boolean;
}

/** An error that the caller gets to see, in the shape of the v1 API. */
export class ApiError extends Error {
  override readonly name = "ApiError";
  readonly details: ApiErrorDetails;

  constructor(details: ApiErrorDetails) {
    super(details.message);
    this.details = details;
  }
}

export function invalidRequest(
  message: string,
  more: Partial<Pick<ApiErrorDetails, "code" | "param" | "status" | "beforeWork">> = {},
): ApiError {
  return new ApiError({ status: 400, type: "invalid_request_error", message, ...more });
}

export function noSuchRecord(kind: string, id: string, param = "id"): ApiError {
  return invalidRequest(`No such ${kind}: '${id}'`, { status: 404, code: "resource_missing", param });
}

export function errorBody(details: ApiErrorDetails, requestId: string): object {
  return {
    error: {
      type: details.type,
      message: details.message,
      ...(details.code === undefined ? {} : { code: details.code }),
      ...(details.declineCode === undefined ? {} : { decline_code: details.declineCode }),
      ...(details.param === undefined ? {} : { param: details.param }),
      request_id: requestId,
    },
  };
}
