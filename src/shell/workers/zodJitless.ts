import { z } from "zod";

// Imported first wherever the program starts: a schema made before this line would try `new Function`, which the page's policy refuses and reports.
z.config({ jitless: true });
