package dev.leadline.density;

/// A shape whose quantiles may span more decades than doubles hold, and are smooth through a link: what is tabulated is
/// then the link of the quantile.
interface Linked {
    Link link();

    /// The link of the quantile for `p` between 0 and 1, both excluded; finite where the quantile itself underflows.
    double linked(double p);

    /// The link of the upper quantile for `q` between 0 and 1, both excluded.
    double upperLinked(double q);
}
