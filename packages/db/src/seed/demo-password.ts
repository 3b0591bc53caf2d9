/**
 * argon2id of the demonstration's one password, which the start script prints. Made once with the cost that the
 * sign-in uses: hashing fifteen accounts at every seeding would cost a second and change the seed each time.
 */
export const demoPasswordHash =
  "$argon2id$v=19$m=19456,t=2,p=1$5u3XrlQNnln3270ZiD0nRg$wdq+QC+/4NvWF1ghN2cwnIFl0Upt1YFA/SWLsGlyNmE";
