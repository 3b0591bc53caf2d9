export { type Connection, connect, type Database } from "@withy/db/client";
