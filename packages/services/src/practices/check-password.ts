import { type Refusal, refusal } from "@withy/core/refusal";

const obvious = ["password", "12345678", "qwertyui", "letmein", "physio"];

/** Length counts, composition does not (NIST SP 800-63B, section 5.1.1.2). Between 12 and 200 characters. */
export function checkPassword(password: string, email: string): Refusal | null {
  if ([...password].length < 12) {
    return refusal(
      "password-short",
      "Use at least 12 characters. Three or four words you can remember work well.",
      "password",
    );
  }
  if (password.length > 200) return refusal("password-long", "Use at most 200 characters.", "password");
  const plain = password.toLowerCase();
  const name = email.split("@")[0]?.toLowerCase() ?? "";
  if (obvious.some((word) => plain.includes(word)) || (name.length > 3 && plain.includes(name))) {
    return refusal(
      "password-obvious",
      "This password is easy to guess. Leave out your name and common words.",
      "password",
    );
  }
  return null;
}
