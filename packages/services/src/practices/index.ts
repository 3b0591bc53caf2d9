export { chooseDeskSite } from "./choose-desk-site";
export { headCounts } from "./head-counts";
export { listSites } from "./list-sites";
export { hashPassword, matchesPassword } from "./password";
export { readSession, type SessionView } from "./read-session";
export { absoluteHours, idleMinutes } from "./session-limits";
export { type SignedIn, type SignInInput, signIn } from "./sign-in";
export { createSignInLimits, type SignInLimits } from "./sign-in-limits";
export { signOut, signOutEverywhere } from "./sign-out";
