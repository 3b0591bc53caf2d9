import { describe, expect, it } from "vitest";
import { readEnv } from "./env";

const least = {
  DATABASE_URL: "mysql://withy_app:x@127.0.0.1:33306/withy",
  NEXTAUTH_URL: "http://localhost:3000",
};

describe("the worker's settings", () => {
  it("send in the clear on this machine only", () => {
    expect(readEnv(least).smtp).toEqual({ host: "127.0.0.1", port: 3125, encryption: "none" });
    expect(readEnv({ ...least, WITHY_SMTP_HOST: "mail.practice.example" }).smtp.encryption).toBe("starttls");
    const clear = { ...least, WITHY_SMTP_HOST: "mail.practice.example", WITHY_SMTP_ENCRYPTION: "none" };
    expect(() => readEnv(clear)).toThrow("must be encrypted");
  });

  it.each([
    ["Withy <post@withy.example>", "post@withy.example"],
    ["post@withy.example", "post@withy.example"],
  ])("take the sender's address from %s", (from, address) => {
    expect(readEnv({ ...least, WITHY_MAIL_FROM: from }).fromAddress).toBe(address);
  });

  it("name every setting that is wrong", () => {
    expect(() => readEnv({ WITHY_SMTP_PORT: "0" })).toThrow(
      /DATABASE_URL[\s\S]*NEXTAUTH_URL[\s\S]*WITHY_SMTP_PORT/,
    );
    expect(() => readEnv({ ...least, WITHY_MAIL_FROM: "nobody" })).toThrow("WITHY_MAIL_FROM");
  });
});
