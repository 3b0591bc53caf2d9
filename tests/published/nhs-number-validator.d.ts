declare module "nhs-number-validator" {
  const validator: { validate(text: string): boolean };
  export default validator;
}
