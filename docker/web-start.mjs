// Loaded before the web server (node --import). The later one wraps the earlier.
import './peer-address.mjs';
import './draining.mjs';
import './request-record.mjs';
import './slow-clients.mjs';
