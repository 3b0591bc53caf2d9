import { hashSecretToken } from "../secret-token";

/** How long a letter can be read by its link. */
export const linkDays = 30;

/** What is kept of a letter's secret, as its column takes it. */
export const hashLetterToken = (token: string): string => hashSecretToken(token).toString("hex");
