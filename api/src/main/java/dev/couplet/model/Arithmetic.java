package dev.couplet.model;

import java.math.BigDecimal;

/**
 * The numbers that an expression is multiplied out in: doubles for objectives, where speed counts;
 * exact decimals for rules, where 0.1 + 0.2 must be 0.3.
 */
interface Arithmetic<N> {
  Arithmetic<Double> DOUBLES =
      new Arithmetic<>() {
        @Override
        public Double of(double value) {
          return value;
        }

        @Override
        public Double times(Double left, Double right) {
          return left * right;
        }

        @Override
        public Double plus(Double left, Double right) {
          return left + right;
        }
      };

  Arithmetic<BigDecimal> DECIMALS =
      new Arithmetic<>() {
        @Override
        public BigDecimal of(double value) {
          return Text.decimal(value);
        }

        @Override
        public BigDecimal times(BigDecimal left, BigDecimal right) {
          return left.multiply(right);
        }

        @Override
        public BigDecimal plus(BigDecimal left, BigDecimal right) {
          return left.add(right);
        }
      };

  N of(double value);

  N times(N left, N right);

  N plus(N left, N right);
}
