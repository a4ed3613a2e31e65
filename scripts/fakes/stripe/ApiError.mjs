/** An answer of the payment API that says no. */
export class ApiError extends Error {
  constructor(status, message, more = {}) {
    super(message);
    this.status = status;
    this.body = { error: { type: "invalid_request_error", message, ...more } };
  }
}

export const noSuch = (what, id) =>
  new ApiError(404, `No such ${what}: '${id}'`, { code: "resource_missing", param: "id" });
