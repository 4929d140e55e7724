'use client';

import { z } from 'zod';
import { faultMessage } from '@/lib/domain/api/fault-message';

// Compiling schemas by `new Function` is what the content security policy forbids.
z.config({ jitless: true, customError: faultMessage });
