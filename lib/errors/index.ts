export { DomainError, errorCodes, isDomainError } from "./domain-error";
export type { DomainErrorDetails, ErrorCode, FieldError } from "./domain-error";
